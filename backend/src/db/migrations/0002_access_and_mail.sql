CREATE TABLE `invitations` (
	`id` text PRIMARY KEY NOT NULL,
	`token_hash` text NOT NULL,
	`email` text NOT NULL,
	`roles` text NOT NULL,
	`invited_by` text NOT NULL,
	`created_at` text NOT NULL,
	`expires_at` text NOT NULL,
	`accepted_at` text,
	`accepted_by` text,
	`revoked_at` text
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `invitations_token_hash_unique` ON `invitations` (`token_hash`);--> statement-breakpoint
CREATE INDEX `invitations_email` ON `invitations` (`email`);--> statement-breakpoint
CREATE TABLE `password_resets` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`created_at` text NOT NULL,
	`expires_at` text NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE INDEX `password_resets_user` ON `password_resets` (`user_id`);--> statement-breakpoint
CREATE TABLE `profiles` (
	`user_id` text PRIMARY KEY NOT NULL,
	`units` text,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	CONSTRAINT "profiles_units" CHECK(units IS NULL OR json_valid(units))
) STRICT;
--> statement-breakpoint
CREATE TABLE `recovery_codes` (
	`user_id` text NOT NULL,
	`code_hash` text NOT NULL,
	`used_at` text,
	PRIMARY KEY(`user_id`, `code_hash`),
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE TABLE `second_factors` (
	`user_id` text PRIMARY KEY NOT NULL,
	`sealed_secret` text NOT NULL,
	`created_at` text NOT NULL,
	`confirmed_at` text,
	`last_step` integer DEFAULT 0 NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE TABLE `sign_ups` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`password_hash` text NOT NULL,
	`roles` text NOT NULL,
	`created_at` text NOT NULL,
	`expires_at` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE INDEX `sign_ups_email` ON `sign_ups` (`email`);--> statement-breakpoint
CREATE TABLE `mail_outbox` (
	`id` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`to_address` text NOT NULL,
	`subject` text NOT NULL,
	`text` text,
	`html` text,
	`secret` integer NOT NULL,
	`message_id` text NOT NULL,
	`once_key` text,
	`status` text NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`due_at` integer NOT NULL,
	`problem` text,
	`created_at` text NOT NULL,
	`sent_at` text,
	CONSTRAINT "mail_outbox_status" CHECK(status IN ('queued', 'sending', 'sent', 'failed'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `mail_outbox_message_id_unique` ON `mail_outbox` (`message_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `mail_outbox_once_key_unique` ON `mail_outbox` (`once_key`);--> statement-breakpoint
CREATE INDEX `mail_outbox_due` ON `mail_outbox` (`status`,`due_at`);--> statement-breakpoint
CREATE INDEX `mail_outbox_address` ON `mail_outbox` (`to_address`,`kind`,`created_at`);--> statement-breakpoint
CREATE TABLE `site_state` (
	`key` text PRIMARY KEY NOT NULL,
	`value` text NOT NULL,
	`at` text NOT NULL,
	CONSTRAINT "site_state_value" CHECK(json_valid(value))
) STRICT;
