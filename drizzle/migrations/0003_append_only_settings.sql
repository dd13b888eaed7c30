CREATE TRIGGER `settings_no_update` BEFORE UPDATE ON `settings`
BEGIN SELECT RAISE(ABORT, 'the firm''s rules are append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `settings_no_delete` BEFORE DELETE ON `settings`
BEGIN SELECT RAISE(ABORT, 'the firm''s rules are append-only'); END;
--> statement-breakpoint
-- Without this, INSERT OR REPLACE would rewrite a row past the two triggers above.
CREATE TRIGGER `settings_no_replace` BEFORE INSERT ON `settings`
WHEN EXISTS (SELECT 1 FROM `settings` WHERE `id` = NEW.`id`)
BEGIN SELECT RAISE(IGNORE); END;
