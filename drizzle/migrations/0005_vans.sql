CREATE TABLE `van_check_ins` (
	`id` text PRIMARY KEY NOT NULL,
	`van_id` text NOT NULL,
	`found` text NOT NULL,
	`missing` text NOT NULL,
	`checked_by` text NOT NULL,
	`checked_at` integer NOT NULL,
	FOREIGN KEY (`van_id`) REFERENCES `places`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `van_check_ins_van` ON `van_check_ins` (`van_id`,`checked_at`);--> statement-breakpoint
CREATE TABLE `van_materials` (
	`id` text PRIMARY KEY NOT NULL,
	`van_id` text NOT NULL,
	`gross` text NOT NULL,
	`note` text NOT NULL,
	`said_by` text NOT NULL,
	`said_at` integer NOT NULL,
	FOREIGN KEY (`van_id`) REFERENCES `places`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `van_materials_van` ON `van_materials` (`van_id`,`said_at`);