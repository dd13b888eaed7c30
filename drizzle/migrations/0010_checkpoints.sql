CREATE TABLE `checkpoints` (
	`number` integer PRIMARY KEY NOT NULL,
	`note` text NOT NULL,
	`asked_by` text
);

--> statement-breakpoint
CREATE TRIGGER `checkpoints_no_update` BEFORE UPDATE ON `checkpoints`
BEGIN SELECT RAISE(ABORT, 'checkpoints are append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `checkpoints_no_delete` BEFORE DELETE ON `checkpoints`
BEGIN SELECT RAISE(ABORT, 'checkpoints are append-only'); END;
--> statement-breakpoint
-- Without this, INSERT OR REPLACE would rewrite a row past the two triggers above.
CREATE TRIGGER `checkpoints_no_replace` BEFORE INSERT ON `checkpoints`
WHEN EXISTS (SELECT 1 FROM `checkpoints` WHERE `number` = NEW.`number`)
BEGIN SELECT RAISE(IGNORE); END;
