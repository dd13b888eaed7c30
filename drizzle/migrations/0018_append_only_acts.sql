CREATE TRIGGER `shipment_acts_no_update` BEFORE UPDATE ON `shipment_acts`
BEGIN SELECT RAISE(ABORT, 'what was done to a shipment is append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `shipment_acts_no_delete` BEFORE DELETE ON `shipment_acts`
BEGIN SELECT RAISE(ABORT, 'what was done to a shipment is append-only'); END;
--> statement-breakpoint
-- Without this, INSERT OR REPLACE would rewrite a row past the two triggers above.
CREATE TRIGGER `shipment_acts_no_replace` BEFORE INSERT ON `shipment_acts`
WHEN EXISTS (SELECT 1 FROM `shipment_acts` WHERE `seq` = NEW.`seq` OR `id` = NEW.`id`)
BEGIN SELECT RAISE(IGNORE); END;
