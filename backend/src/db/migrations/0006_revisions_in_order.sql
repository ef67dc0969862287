DROP INDEX `revisions_edition`;--> statement-breakpoint
CREATE INDEX `revisions_edition` ON `revisions` (`edition`,`record_id`,`revision`);