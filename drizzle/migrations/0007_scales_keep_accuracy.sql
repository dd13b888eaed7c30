-- What was weighed on a scale was judged by its accuracy, and is again whenever the log is read anew.
CREATE TRIGGER `scales_keep_accuracy` BEFORE UPDATE ON `scales`
WHEN NEW.`id` IS NOT OLD.`id` OR NEW.`accuracy_grams` IS NOT OLD.`accuracy_grams` OR NEW.`accuracy_basis_points` IS NOT OLD.`accuracy_basis_points`
BEGIN SELECT RAISE(ABORT, 'a scale keeps its accuracy'); END;
--> statement-breakpoint
CREATE TRIGGER `scales_no_delete` BEFORE DELETE ON `scales`
BEGIN SELECT RAISE(ABORT, 'a scale is turned off, not deleted'); END;
--> statement-breakpoint
-- Without this, INSERT OR REPLACE would rewrite a row past the two triggers above.
CREATE TRIGGER `scales_no_replace` BEFORE INSERT ON `scales`
WHEN EXISTS (SELECT 1 FROM `scales` WHERE `id` = NEW.`id`)
BEGIN SELECT RAISE(IGNORE); END;
