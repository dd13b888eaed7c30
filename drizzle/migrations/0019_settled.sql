ALTER TABLE `shipments` RENAME COLUMN `received_at` TO `settled_at`;--> statement-breakpoint
UPDATE `shipments` SET `state` = 'settled' WHERE `state` = 'received';
