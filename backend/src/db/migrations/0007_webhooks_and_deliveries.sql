CREATE TABLE `deliveries` (
	`id` text PRIMARY KEY NOT NULL,
	`webhook_id` text NOT NULL,
	`message_id` text NOT NULL,
	`topic` text NOT NULL,
	`body` text NOT NULL,
	`status` text NOT NULL,
	`tries` integer DEFAULT 0 NOT NULL,
	`due_at` integer NOT NULL,
	`last_try_at` text,
	`last_status` integer,
	`last_error` text,
	`last_ms` integer,
	`created_at` text NOT NULL,
	FOREIGN KEY (`webhook_id`) REFERENCES `webhooks`(`id`) ON UPDATE no action ON DELETE cascade,
	CONSTRAINT "deliveries_status" CHECK(status IN ('waiting', 'sending', 'delivered', 'failed'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `deliveries_due` ON `deliveries` (`status`,`due_at`);--> statement-breakpoint
CREATE INDEX `deliveries_webhook` ON `deliveries` (`webhook_id`,`id`);--> statement-breakpoint
CREATE UNIQUE INDEX `deliveries_message` ON `deliveries` (`webhook_id`,`message_id`);--> statement-breakpoint
CREATE TABLE `webhooks` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`url` text NOT NULL,
	`name` text NOT NULL,
	`topics` text NOT NULL,
	`secret` text NOT NULL,
	`previous_secret` text,
	`previous_until` text,
	`disabled_at` text,
	`disabled_why` text,
	`revision` integer DEFAULT 1 NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	CONSTRAINT "webhooks_topics" CHECK(json_valid(topics))
) STRICT;
--> statement-breakpoint
CREATE INDEX `webhooks_user` ON `webhooks` (`user_id`);