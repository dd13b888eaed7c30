CREATE TABLE `halves` (
	`event_id` text PRIMARY KEY NOT NULL,
	`cylinder_id` text NOT NULL,
	`other_id` text NOT NULL,
	`position` integer NOT NULL,
	`half` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `halves_cylinder` ON `halves` (`cylinder_id`,`position`);--> statement-breakpoint
CREATE INDEX `halves_other` ON `halves` (`other_id`,`cylinder_id`,`position`);