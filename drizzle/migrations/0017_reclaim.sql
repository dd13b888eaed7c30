CREATE TABLE `disputes` (
	`id` text PRIMARY KEY NOT NULL,
	`shipment_id` text NOT NULL,
	`cylinder_id` text,
	`about` text NOT NULL,
	`opened_by` text,
	`opened_at` integer NOT NULL,
	`outcome` text,
	`reason` text,
	`ended_by` text,
	`ended_at` integer,
	FOREIGN KEY (`shipment_id`) REFERENCES `shipments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `disputes_shipment` ON `disputes` (`shipment_id`);--> statement-breakpoint
CREATE TABLE `dock_links` (
	`id` text PRIMARY KEY NOT NULL,
	`shipment_id` text NOT NULL,
	`for_whom` text NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`revoked_by` text,
	`revoked_at` integer,
	`first_used_at` integer,
	FOREIGN KEY (`shipment_id`) REFERENCES `shipments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `dock_links_shipment` ON `dock_links` (`shipment_id`);--> statement-breakpoint
CREATE TABLE `firm_prices` (
	`id` text PRIMARY KEY NOT NULL,
	`firm_id` text NOT NULL,
	`refrigerant` text,
	`condition` text NOT NULL,
	`from_day` text NOT NULL,
	`until_day` text,
	`mills` integer NOT NULL,
	`per` text NOT NULL,
	`recorded_by` text NOT NULL,
	`recorded_at` integer NOT NULL,
	`withdrawn_by` text,
	`withdrawn_at` integer,
	FOREIGN KEY (`firm_id`) REFERENCES `firms`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `firm_prices_firm` ON `firm_prices` (`firm_id`,`refrigerant`,`condition`);--> statement-breakpoint
CREATE TABLE `firm_terms` (
	`id` text PRIMARY KEY NOT NULL,
	`firm_id` text NOT NULL,
	`from_day` text NOT NULL,
	`terms` text NOT NULL,
	`recorded_by` text NOT NULL,
	`recorded_at` integer NOT NULL,
	`withdrawn_by` text,
	`withdrawn_at` integer,
	FOREIGN KEY (`firm_id`) REFERENCES `firms`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `firm_terms_firm` ON `firm_terms` (`firm_id`,`from_day`);--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` text PRIMARY KEY NOT NULL,
	`number` integer NOT NULL,
	`customer_id` text,
	`customer_name` text NOT NULL,
	`email` text,
	`site` text NOT NULL,
	`equipment` text NOT NULL,
	`refrigerant` text,
	`charge` text,
	`keeps` text NOT NULL,
	`note` text,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`customer_id`) REFERENCES `firms`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `jobs_number_unique` ON `jobs` (`number`);--> statement-breakpoint
CREATE INDEX `jobs_customer` ON `jobs` (`customer_id`);--> statement-breakpoint
CREATE TABLE `mail_attachments` (
	`mail_id` text NOT NULL,
	`position` integer NOT NULL,
	`name` text NOT NULL,
	`media_type` text NOT NULL,
	`content` blob NOT NULL,
	PRIMARY KEY(`mail_id`, `position`),
	FOREIGN KEY (`mail_id`) REFERENCES `mail`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `plan_tasks` (
	`plan_id` text NOT NULL,
	`position` integer NOT NULL,
	`kind` text NOT NULL,
	`from_cylinder_id` text NOT NULL,
	`to_cylinder_id` text,
	`net_grams` integer,
	`done_event_id` text,
	`done_at` integer,
	PRIMARY KEY(`plan_id`, `position`),
	FOREIGN KEY (`plan_id`) REFERENCES `plans`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `plan_tasks_from` ON `plan_tasks` (`from_cylinder_id`);--> statement-breakpoint
CREATE TABLE `plans` (
	`id` text PRIMARY KEY NOT NULL,
	`number` integer NOT NULL,
	`kind` text NOT NULL,
	`question` text NOT NULL,
	`answer` text NOT NULL,
	`state` text NOT NULL,
	`made_by` text NOT NULL,
	`made_at` integer NOT NULL,
	`ended_at` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `plans_number_unique` ON `plans` (`number`);--> statement-breakpoint
CREATE TABLE `settlement_lines` (
	`shipment_id` text NOT NULL,
	`cylinder_id` text NOT NULL,
	`their_gross` text,
	`accepted_net` text,
	`grade` text,
	`mills` integer,
	`per` text,
	`stated_cents` integer,
	`outcome` text,
	PRIMARY KEY(`shipment_id`, `cylinder_id`),
	FOREIGN KEY (`shipment_id`) REFERENCES `shipments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `settlements` (
	`shipment_id` text PRIMARY KEY NOT NULL,
	`statement_number` text,
	`statement_day` text,
	`others` text NOT NULL,
	`stated_total_cents` integer,
	FOREIGN KEY (`shipment_id`) REFERENCES `shipments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `shipment_acts` (
	`seq` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`id` text NOT NULL,
	`shipment_id` text NOT NULL,
	`kind` text NOT NULL,
	`cylinder_id` text,
	`details` text NOT NULL,
	`person_id` text,
	`link_id` text,
	`link_name` text,
	`occurred_at` integer NOT NULL,
	`recorded_at` integer NOT NULL,
	FOREIGN KEY (`shipment_id`) REFERENCES `shipments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `shipment_acts_id_unique` ON `shipment_acts` (`id`);--> statement-breakpoint
CREATE INDEX `shipment_acts_shipment` ON `shipment_acts` (`shipment_id`,`seq`);--> statement-breakpoint
CREATE TABLE `shipment_files` (
	`id` text PRIMARY KEY NOT NULL,
	`shipment_id` text NOT NULL,
	`kind` text NOT NULL,
	`name` text NOT NULL,
	`media_type` text NOT NULL,
	`bytes` integer NOT NULL,
	`content_hash` text NOT NULL,
	`cylinder_ids` text NOT NULL,
	`uploaded_by` text NOT NULL,
	`uploaded_at` integer NOT NULL,
	FOREIGN KEY (`shipment_id`) REFERENCES `shipments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `shipment_files_shipment` ON `shipment_files` (`shipment_id`);--> statement-breakpoint
ALTER TABLE `firm` ADD `address` text;--> statement-breakpoint
ALTER TABLE `firm` ADD `emergency_telephone` text;--> statement-breakpoint
ALTER TABLE `firm` ADD `emergency_contract` text;--> statement-breakpoint
ALTER TABLE `shipment_lines` ADD `weighed` text;--> statement-breakpoint
ALTER TABLE `shipment_lines` ADD `classification` text;--> statement-breakpoint
ALTER TABLE `shipments` ADD `ready_at` integer;--> statement-breakpoint
ALTER TABLE `shipments` ADD `arrived_at` integer;--> statement-breakpoint
ALTER TABLE `shipments` ADD `closed_at` integer;--> statement-breakpoint
ALTER TABLE `shipments` ADD `cancelled_at` integer;--> statement-breakpoint
ALTER TABLE `shipments` ADD `carrier_id` text REFERENCES firms(id);--> statement-breakpoint
ALTER TABLE `shipments` ADD `papers` text;