CREATE TABLE `import_edits` (
	`import_id` text NOT NULL,
	`n` integer NOT NULL,
	`cells` text NOT NULL,
	`decision` text,
	`resolution` text,
	PRIMARY KEY(`import_id`, `n`),
	FOREIGN KEY (`import_id`) REFERENCES `imports`(`id`) ON UPDATE no action ON DELETE cascade,
	CONSTRAINT "import_edits_decision" CHECK(decision IS NULL OR decision IN ('accept', 'skip')),
	CONSTRAINT "import_edits_resolution" CHECK(resolution IS NULL OR resolution IN ('catalog', 'row'))
) STRICT;
--> statement-breakpoint
CREATE TABLE `mappings` (
	`id` text PRIMARY KEY NOT NULL,
	`table_name` text NOT NULL,
	`fingerprint` text NOT NULL,
	`mapping` text NOT NULL,
	`saved_at` text NOT NULL,
	`saved_by` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `mappings_header` ON `mappings` (`table_name`,`fingerprint`);--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`edition` integer,
	`topic` text NOT NULL,
	`payload` text NOT NULL,
	`created_at` text NOT NULL,
	CONSTRAINT "outbox_topic" CHECK(topic IN ('edition.published', 'hull.changed', 'hull.superseded', 'correction.decided'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `outbox_edition` ON `outbox` (`edition`);--> statement-breakpoint
ALTER TABLE `revisions` ADD `origins` text;--> statement-breakpoint
ALTER TABLE `import_rows` ADD `row_key` text;--> statement-breakpoint
CREATE INDEX `import_rows_key` ON `import_rows` (`import_id`,`row_key`);--> statement-breakpoint
ALTER TABLE `imports` ADD `header_row` integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE `imports` ADD `needs_mapping` integer DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE `imports` ADD `mapping` text;--> statement-breakpoint
ALTER TABLE `imports` ADD `fixes` text DEFAULT '[]' NOT NULL;--> statement-breakpoint
-- Rows judged by the code before this one carry another shape: their imports are checked again.
DELETE FROM `import_rows` WHERE `import_id` IN (SELECT `id` FROM `imports` WHERE `status` IN ('checking', 'checked', 'publishing'));--> statement-breakpoint
UPDATE `imports` SET `status` = 'uploaded', `counts` = NULL, `checked_rows` = 0 WHERE `status` IN ('checking', 'checked', 'publishing');
