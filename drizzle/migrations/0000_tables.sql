CREATE TABLE `custody_events` (
	`seq` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`id` text NOT NULL,
	`cylinder_id` text NOT NULL,
	`version` integer NOT NULL,
	`device_id` text NOT NULL,
	`device_seq` integer NOT NULL,
	`kind` text NOT NULL,
	`occurred_at` integer NOT NULL,
	`occurred_offset_minutes` integer NOT NULL,
	`clock_skew_seconds` integer NOT NULL,
	`effective_at` integer NOT NULL,
	`recorded_at` integer NOT NULL,
	`actor_id` text NOT NULL,
	`posted_by` text NOT NULL,
	`supervisor_id` text,
	`trainee` integer NOT NULL,
	`place_id` text,
	`body` text NOT NULL,
	`content_hash` text NOT NULL,
	`prev_hash` text NOT NULL,
	`hash` text NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `custody_events_id_unique` ON `custody_events` (`id`);--> statement-breakpoint
CREATE UNIQUE INDEX `custody_events_cylinder_version` ON `custody_events` (`cylinder_id`,`version`);--> statement-breakpoint
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
	`state` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `cylinders_label` ON `cylinders` (`label_code`);--> statement-breakpoint
CREATE INDEX `cylinders_serial` ON `cylinders` (`serial`);--> statement-breakpoint
CREATE INDEX `cylinders_place` ON `cylinders` (`place_id`);--> statement-breakpoint
CREATE INDEX `cylinders_holder` ON `cylinders` (`holder_id`);--> statement-breakpoint
CREATE INDEX `cylinders_refrigerant` ON `cylinders` (`refrigerant`);--> statement-breakpoint
CREATE INDEX `cylinders_due` ON `cylinders` (`due_month`);--> statement-breakpoint
CREATE INDEX `cylinders_last_event` ON `cylinders` (`last_event_at`);--> statement-breakpoint
CREATE TABLE `firm` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`telephone` text NOT NULL,
	`time_zone` text NOT NULL,
	`units` text NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `firms` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`kind` text NOT NULL,
	`telephone` text,
	`email` text,
	`address` text,
	`rin` text,
	`active` integer DEFAULT true NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `label_claims` (
	`event_id` text PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`cylinder_id` text NOT NULL,
	`effective_at` integer NOT NULL,
	`device_id` text NOT NULL,
	`device_seq` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `label_claims_code` ON `label_claims` (`code`);--> statement-breakpoint
CREATE INDEX `label_claims_cylinder` ON `label_claims` (`cylinder_id`);--> statement-breakpoint
CREATE TABLE `labels` (
	`code` text PRIMARY KEY NOT NULL,
	`minted_at` integer NOT NULL,
	`minted_by` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `mail` (
	`id` text PRIMARY KEY NOT NULL,
	`recipient` text NOT NULL,
	`subject` text NOT NULL,
	`body` text NOT NULL,
	`created_at` integer NOT NULL,
	`sent_at` integer,
	`error` text
);
--> statement-breakpoint
CREATE TABLE `meta` (
	`key` text PRIMARY KEY NOT NULL,
	`value` text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE TABLE `movements` (
	`cylinder_id` text NOT NULL,
	`event_id` text NOT NULL,
	`ordinal` integer NOT NULL,
	`cause` text NOT NULL,
	`refrigerant` text,
	`owner_id` text,
	`grams` integer NOT NULL,
	`at` integer NOT NULL,
	`apart` integer NOT NULL,
	PRIMARY KEY(`cylinder_id`, `event_id`, `ordinal`)
);
--> statement-breakpoint
CREATE INDEX `movements_at` ON `movements` (`at`);--> statement-breakpoint
CREATE TABLE `one_time_links` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`purpose` text NOT NULL,
	`person_id` text,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`used_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `one_time_links_person` ON `one_time_links` (`person_id`);--> statement-breakpoint
CREATE TABLE `open_lines` (
	`cylinder_id` text PRIMARY KEY NOT NULL,
	`list_kind` text NOT NULL,
	`list_id` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `open_lines_list` ON `open_lines` (`list_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`roles` text NOT NULL,
	`trainee` integer DEFAULT false NOT NULL,
	`certification` text,
	`units` text NOT NULL,
	`password_hash` text,
	`active` integer DEFAULT true NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email_unique` ON `people` (`email`);--> statement-breakpoint
CREATE TABLE `places` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`kind` text NOT NULL,
	`parent_id` text,
	`firm_id` text,
	`technician_id` text,
	`active` integer DEFAULT true NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`firm_id`) REFERENCES `firms`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`technician_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `places_firm` ON `places` (`firm_id`);--> statement-breakpoint
CREATE TABLE `scales` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`accuracy_grams` integer NOT NULL,
	`accuracy_basis_points` integer NOT NULL,
	`last_check_on` text,
	`active` integer DEFAULT true NOT NULL
);
--> statement-breakpoint
CREATE TABLE `security_log` (
	`id` text PRIMARY KEY NOT NULL,
	`at` integer NOT NULL,
	`person_id` text,
	`what` text NOT NULL,
	`subject` text
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`secret_hash` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`last_seen_at` integer NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `sessions_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE TABLE `settings` (
	`id` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`from_at` integer NOT NULL,
	`value` text NOT NULL,
	`reason` text NOT NULL,
	`set_by` text NOT NULL,
	`set_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `settings_kind_from` ON `settings` (`kind`,`from_at`);--> statement-breakpoint
CREATE TABLE `shipment_lines` (
	`shipment_id` text NOT NULL,
	`cylinder_id` text NOT NULL,
	`position` integer NOT NULL,
	`sent` text,
	PRIMARY KEY(`shipment_id`, `cylinder_id`),
	FOREIGN KEY (`shipment_id`) REFERENCES `shipments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `shipments` (
	`id` text PRIMARY KEY NOT NULL,
	`number` integer NOT NULL,
	`to_firm_id` text NOT NULL,
	`state` text NOT NULL,
	`note` text,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	`dispatched_at` integer,
	`dispatched_by` text,
	`received_at` integer,
	FOREIGN KEY (`to_firm_id`) REFERENCES `firms`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `shipments_number_unique` ON `shipments` (`number`);--> statement-breakpoint
CREATE TABLE `test_lot_lines` (
	`lot_id` text NOT NULL,
	`cylinder_id` text NOT NULL,
	`position` integer NOT NULL,
	PRIMARY KEY(`lot_id`, `cylinder_id`),
	FOREIGN KEY (`lot_id`) REFERENCES `test_lots`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `test_lots` (
	`id` text PRIMARY KEY NOT NULL,
	`number` integer NOT NULL,
	`requalifier_id` text NOT NULL,
	`state` text NOT NULL,
	`note` text,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	`sent_at` integer,
	`sent_by` text,
	`back_at` integer,
	FOREIGN KEY (`requalifier_id`) REFERENCES `firms`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `test_lots_number_unique` ON `test_lots` (`number`);