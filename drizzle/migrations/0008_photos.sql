CREATE TABLE `attachment_events` (
	`attachment_id` text NOT NULL,
	`event_id` text NOT NULL,
	`put_by` text NOT NULL,
	`put_at` integer NOT NULL,
	PRIMARY KEY(`attachment_id`, `event_id`),
	FOREIGN KEY (`attachment_id`) REFERENCES `attachments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `attachment_events_event` ON `attachment_events` (`event_id`);--> statement-breakpoint
CREATE TABLE `attachments` (
	`id` text PRIMARY KEY NOT NULL,
	`subject` text NOT NULL,
	`taken_at` integer,
	`sent_by` text NOT NULL,
	`arrived_at` integer NOT NULL,
	`source_hash` text NOT NULL,
	`content_hash` text NOT NULL,
	`bytes` integer NOT NULL,
	`width` integer NOT NULL,
	`height` integer NOT NULL
);
