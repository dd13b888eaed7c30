DROP INDEX `stock_changes_balance`;--> statement-breakpoint
ALTER TABLE `stock_changes` ADD `weighed_together` integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `stock_changes` ADD `found_together` integer DEFAULT 0 NOT NULL;--> statement-breakpoint
CREATE INDEX `stock_changes_balance` ON `stock_changes` (`refrigerant`,`owner_id`,`apart`,`at`,`grams`,`not_known`,`weighed_variance`,`found_variance`,`weighed_together`,`found_together`);