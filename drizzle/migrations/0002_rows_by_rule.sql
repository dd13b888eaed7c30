ALTER TABLE `cylinders` ADD `ruled_by` text DEFAULT '' NOT NULL;--> statement-breakpoint
CREATE INDEX `cylinders_ruled_by` ON `cylinders` (`ruled_by`);