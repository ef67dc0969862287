CREATE TABLE `idempotency_keys` (
	`user_id` text NOT NULL,
	`operation` text NOT NULL,
	`key` text NOT NULL,
	`request_hash` text NOT NULL,
	`answer` text,
	`created_at` integer NOT NULL,
	PRIMARY KEY(`user_id`, `operation`, `key`),
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE TABLE `limits` (
	`caller` text PRIMARY KEY NOT NULL,
	`units_per_minute` integer NOT NULL,
	`units_per_day` integer,
	`changed_at` text NOT NULL,
	`changed_by` text NOT NULL,
	CONSTRAINT "limits_caller" CHECK(caller IN ('anonymous', 'page', 'account', 'key')),
	CONSTRAINT "limits_minute" CHECK(units_per_minute BETWEEN 1 AND 1000000000),
	CONSTRAINT "limits_day" CHECK(units_per_day IS NULL OR units_per_day BETWEEN 1 AND 1000000000)
) STRICT;
--> statement-breakpoint
CREATE TABLE `usage` (
	`key_id` text NOT NULL,
	`day` text NOT NULL,
	`requests` integer NOT NULL,
	`units` integer NOT NULL,
	`refused` integer NOT NULL,
	PRIMARY KEY(`key_id`, `day`),
	FOREIGN KEY (`key_id`) REFERENCES `api_keys`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE TABLE `saved_fits` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`boat_id` text,
	`name` text NOT NULL,
	`note` text,
	`question` text NOT NULL,
	`answer` text NOT NULL,
	`engine_version` text NOT NULL,
	`edition` integer NOT NULL,
	`revision` integer DEFAULT 1 NOT NULL,
	`created_at` text NOT NULL,
	`updated_at` text NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`boat_id`) REFERENCES `boats`(`id`) ON UPDATE no action ON DELETE set null,
	CONSTRAINT "saved_fits_question" CHECK(json_valid(question)),
	CONSTRAINT "saved_fits_answer" CHECK(json_valid(answer)),
	CONSTRAINT "saved_fits_revision" CHECK(revision >= 1)
) STRICT;
--> statement-breakpoint
CREATE INDEX `saved_fits_user` ON `saved_fits` (`user_id`);--> statement-breakpoint
CREATE TABLE `shares` (
	`id` text PRIMARY KEY NOT NULL,
	`token` text NOT NULL,
	`user_id` text NOT NULL,
	`fit_id` text NOT NULL,
	`created_at` text NOT NULL,
	`revoked_at` text,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`fit_id`) REFERENCES `saved_fits`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `shares_token_unique` ON `shares` (`token`);--> statement-breakpoint
CREATE INDEX `shares_user` ON `shares` (`user_id`);--> statement-breakpoint
ALTER TABLE `api_keys` ADD `kind` text DEFAULT 'server' NOT NULL;--> statement-breakpoint
ALTER TABLE `api_keys` ADD `origins` text DEFAULT '[]' NOT NULL;--> statement-breakpoint
ALTER TABLE `api_keys` ADD `previous_hash` text;--> statement-breakpoint
ALTER TABLE `api_keys` ADD `previous_until` text;--> statement-breakpoint
ALTER TABLE `api_keys` ADD `expires_at` text;--> statement-breakpoint
ALTER TABLE `boats` ADD `revision` integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE `boats` ADD `updated_at` text DEFAULT '' NOT NULL;