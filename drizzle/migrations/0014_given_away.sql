-- A cache, made again from the log at the next start: the column stands before the state, which is long, so that a count need not read past it.
DROP TABLE `cylinders`;--> statement-breakpoint
CREATE TABLE `cylinders` (
	`id` text PRIMARY KEY NOT NULL,
	`version` integer NOT NULL,
	`label_code` text,
	`serial` text,
	`spec` text,
	`place_id` text,
	`holder_id` text,
	`owner_id` text,
	`refrigerant` text,
	`condition` text NOT NULL,
	`lifecycle` text NOT NULL,
	`given_away` integer DEFAULT false NOT NULL,
	`nothing_in_it` integer NOT NULL,
	`net_grams` integer,
	`fill_limit_grams` integer,
	`governing_rule` text,
	`room_grams` integer,
	`stop_weight_grams` integer,
	`exact_stop_weight` text,
	`tare_weight_grams` integer,
	`water_capacity_grams` integer,
	`due_month` text,
	`retest_state` text NOT NULL,
	`last_event_at` integer,
	`last_event_kind` text,
	`last_seen_at` integer,
	`finding_codes` text NOT NULL,
	`severity` integer NOT NULL,
	`state` text NOT NULL,
	`ruled_by` text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE INDEX `cylinders_ruled_by` ON `cylinders` (`ruled_by`);--> statement-breakpoint
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
CREATE INDEX `cylinders_last_event` ON `cylinders` (`last_event_at`,`id`);--> statement-breakpoint
CREATE INDEX `cylinders_given_away` ON `cylinders` (`given_away`);