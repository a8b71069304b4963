CREATE TRIGGER `activity_no_update` BEFORE UPDATE ON `activity` BEGIN SELECT RAISE(ABORT, 'activity is append-only'); END;--> statement-breakpoint
CREATE TRIGGER `activity_no_delete` BEFORE DELETE ON `activity` BEGIN SELECT RAISE(ABORT, 'activity is append-only'); END;
