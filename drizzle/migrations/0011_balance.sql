CREATE TABLE `stock_changes` (
	`cylinder_id` text NOT NULL,
	`event_id` text NOT NULL,
	`ordinal` integer NOT NULL,
	`refrigerant` text,
	`owner_id` text,
	`grams` integer NOT NULL,
	`not_known` integer NOT NULL,
	`weighed_variance` integer NOT NULL,
	`found_variance` integer NOT NULL,
	`at` integer NOT NULL,
	`apart` integer NOT NULL,
	PRIMARY KEY(`cylinder_id`, `event_id`, `ordinal`)
);
--> statement-breakpoint
CREATE INDEX `stock_changes_balance` ON `stock_changes` (`refrigerant`,`owner_id`,`apart`,`at`,`grams`,`not_known`,`weighed_variance`,`found_variance`);--> statement-breakpoint
DROP INDEX `movements_at`;--> statement-breakpoint
CREATE INDEX `movements_balance` ON `movements` (`refrigerant`,`owner_id`,`cause`,`apart`,`at`,`grams`);