CREATE TABLE `job_notes` (
	`id` text PRIMARY KEY NOT NULL,
	`job_id` text NOT NULL,
	`issue` integer NOT NULL,
	`recipient` text NOT NULL,
	`mail_id` text,
	`sent_by` text NOT NULL,
	`sent_at` integer NOT NULL,
	FOREIGN KEY (`job_id`) REFERENCES `jobs`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`mail_id`) REFERENCES `mail`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `job_notes_job` ON `job_notes` (`job_id`);--> statement-breakpoint
ALTER TABLE `jobs` ADD `opened` text;--> statement-breakpoint
ALTER TABLE `jobs` ADD `changes` integer DEFAULT 0 NOT NULL;--> statement-breakpoint
CREATE INDEX `custody_events_job` ON `custody_events` ((CASE WHEN json_valid(body) THEN CASE WHEN kind = 'corrected' THEN lower(body ->> '$.details.instead.jobId') ELSE body ->> '$.details.jobId' END END)) WHERE (CASE WHEN json_valid(body) THEN CASE WHEN kind = 'corrected' THEN lower(body ->> '$.details.instead.jobId') ELSE body ->> '$.details.jobId' END END) IS NOT NULL;