CREATE TABLE `job_results` (
	`job_id` text NOT NULL,
	`hull_id` text NOT NULL,
	`verdict` text NOT NULL,
	`reasons` text NOT NULL,
	PRIMARY KEY(`job_id`, `hull_id`),
	FOREIGN KEY (`job_id`) REFERENCES `jobs`(`id`) ON UPDATE no action ON DELETE cascade,
	CONSTRAINT "job_results_verdict" CHECK(verdict IN ('fits', 'fits-with-care', 'does-not-fit', 'cannot-tell'))
) STRICT;
--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`order_json` text NOT NULL,
	`status` text NOT NULL,
	`done` integer DEFAULT 0 NOT NULL,
	`total` integer NOT NULL,
	`edition` integer NOT NULL,
	`error` text,
	`created_at` text NOT NULL,
	`ended_at` text,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	CONSTRAINT "jobs_status" CHECK(status IN ('waiting', 'running', 'done', 'cancelled', 'failed')),
	CONSTRAINT "jobs_order" CHECK(json_valid(order_json))
) STRICT;
--> statement-breakpoint
CREATE INDEX `jobs_user` ON `jobs` (`user_id`);