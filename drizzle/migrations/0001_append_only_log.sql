CREATE TRIGGER `custody_events_no_update` BEFORE UPDATE ON `custody_events`
BEGIN SELECT RAISE(ABORT, 'the custody log is append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `custody_events_no_delete` BEFORE DELETE ON `custody_events`
BEGIN SELECT RAISE(ABORT, 'the custody log is append-only'); END;
--> statement-breakpoint
-- Without this, INSERT OR REPLACE would rewrite a row past the two triggers above.
CREATE TRIGGER `custody_events_no_replace` BEFORE INSERT ON `custody_events`
WHEN EXISTS (SELECT 1 FROM `custody_events` WHERE `seq` = NEW.`seq` OR `id` = NEW.`id` OR (`cylinder_id` = NEW.`cylinder_id` AND `version` = NEW.`version`))
BEGIN SELECT RAISE(IGNORE); END;
