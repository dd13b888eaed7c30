CREATE TABLE `fleet_views` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`name` text NOT NULL,
	`query` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `fleet_views_person_name` ON `fleet_views` (`person_id`,`name`);--> statement-breakpoint
CREATE TABLE `table_layouts` (
	`person_id` text NOT NULL,
	`table_name` text NOT NULL,
	`columns` text NOT NULL,
	`density` text NOT NULL,
	PRIMARY KEY(`person_id`, `table_name`),
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
DROP INDEX `cylinders_label`;--> statement-breakpoint
DROP INDEX `cylinders_serial`;--> statement-breakpoint
DROP INDEX `cylinders_place`;--> statement-breakpoint
DROP INDEX `cylinders_holder`;--> statement-breakpoint
DROP INDEX `cylinders_refrigerant`;--> statement-breakpoint
DROP INDEX `cylinders_due`;--> statement-breakpoint
DROP INDEX `cylinders_last_event`;--> statement-breakpoint
CREATE INDEX `cylinders_owner` ON `cylinders` (`owner_id`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_condition` ON `cylinders` (`condition`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_lifecycle` ON `cylinders` (`lifecycle`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_net` ON `cylinders` (`net_grams`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_room` ON `cylinders` (`room_grams`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_stop_weight` ON `cylinders` (`stop_weight_grams`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_last_seen` ON `cylinders` (`last_seen_at`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_severity` ON `cylinders` (`severity`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_label` ON `cylinders` (`label_code`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_serial` ON `cylinders` (`serial`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_place` ON `cylinders` (`place_id`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_holder` ON `cylinders` (`holder_id`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_refrigerant` ON `cylinders` (`refrigerant`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_due` ON `cylinders` (`due_month`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_last_event` ON `cylinders` (`last_event_at`,`id`);