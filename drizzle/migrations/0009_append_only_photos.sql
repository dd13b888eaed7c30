CREATE TRIGGER `attachments_no_update` BEFORE UPDATE ON `attachments`
BEGIN SELECT RAISE(ABORT, 'photos are append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `attachments_no_delete` BEFORE DELETE ON `attachments`
BEGIN SELECT RAISE(ABORT, 'photos are append-only'); END;
--> statement-breakpoint
-- Without this, INSERT OR REPLACE would rewrite a row past the two triggers above.
CREATE TRIGGER `attachments_no_replace` BEFORE INSERT ON `attachments`
WHEN EXISTS (SELECT 1 FROM `attachments` WHERE `id` = NEW.`id`)
BEGIN SELECT RAISE(IGNORE); END;
--> statement-breakpoint
CREATE TRIGGER `attachment_events_no_update` BEFORE UPDATE ON `attachment_events`
BEGIN SELECT RAISE(ABORT, 'photos are append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `attachment_events_no_delete` BEFORE DELETE ON `attachment_events`
BEGIN SELECT RAISE(ABORT, 'photos are append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `attachment_events_no_replace` BEFORE INSERT ON `attachment_events`
WHEN EXISTS (SELECT 1 FROM `attachment_events` WHERE `attachment_id` = NEW.`attachment_id` AND `event_id` = NEW.`event_id`)
BEGIN SELECT RAISE(IGNORE); END;
