ALTER TABLE `people` ADD `certification_type` text;--> statement-breakpoint
ALTER TABLE `people` ADD `certification_number` text;--> statement-breakpoint
ALTER TABLE `people` ADD `supervisor_id` text;--> statement-breakpoint
ALTER TABLE `scales` ADD `accuracy_entered` text;