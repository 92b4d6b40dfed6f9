-- Two slots never stand in one room at once, unless an override was recorded (slots last 12 h at most).
CREATE TRIGGER `slots_room_free_insert` BEFORE INSERT ON `slots` WHEN NEW.`cancelled_at` IS NULL
BEGIN
	SELECT RAISE(ABORT, 'room-overlap') WHERE EXISTS (
		SELECT 1 FROM `slots` s WHERE s.`room_id` = NEW.`room_id` AND s.`cancelled_at` IS NULL
		AND s.`starts_at` < NEW.`ends_at` AND s.`starts_at` > NEW.`starts_at` - 43200000 AND s.`ends_at` > NEW.`starts_at`
	) AND NOT EXISTS (SELECT 1 FROM `clash_overrides` o WHERE o.`slot_uid` = NEW.`uid` AND o.`kind` = 'room');
END;
--> statement-breakpoint
CREATE TRIGGER `slots_room_free_update` BEFORE UPDATE OF `room_id`, `starts_at`, `ends_at`, `cancelled_at` ON `slots` WHEN NEW.`cancelled_at` IS NULL
BEGIN
	SELECT RAISE(ABORT, 'room-overlap') WHERE EXISTS (
		SELECT 1 FROM `slots` s WHERE s.`room_id` = NEW.`room_id` AND s.`cancelled_at` IS NULL AND s.`id` <> NEW.`id`
		AND s.`starts_at` < NEW.`ends_at` AND s.`starts_at` > NEW.`starts_at` - 43200000 AND s.`ends_at` > NEW.`starts_at`
	) AND NOT EXISTS (SELECT 1 FROM `clash_overrides` o WHERE o.`slot_uid` = NEW.`uid` AND o.`kind` = 'room');
END;
--> statement-breakpoint
-- One coach never stands in two slots at once, unless an override was recorded.
CREATE TRIGGER `slot_coaches_free_insert` BEFORE INSERT ON `slot_coaches`
BEGIN
	SELECT RAISE(ABORT, 'coach-overlap') WHERE EXISTS (
		SELECT 1 FROM `slots` n, `slots` s JOIN `slot_coaches` c ON c.`slot_id` = s.`id`
		WHERE n.`id` = NEW.`slot_id` AND n.`cancelled_at` IS NULL AND c.`person_id` = NEW.`person_id` AND s.`id` <> n.`id` AND s.`cancelled_at` IS NULL
		AND s.`starts_at` < n.`ends_at` AND s.`starts_at` > n.`starts_at` - 43200000 AND s.`ends_at` > n.`starts_at`
		AND NOT EXISTS (SELECT 1 FROM `clash_overrides` o WHERE o.`slot_uid` = n.`uid` AND o.`kind` = 'coach')
	);
END;
--> statement-breakpoint
CREATE TRIGGER `slot_coaches_free_update` BEFORE UPDATE ON `slot_coaches`
BEGIN
	SELECT RAISE(ABORT, 'coach-overlap') WHERE EXISTS (
		SELECT 1 FROM `slots` n, `slots` s JOIN `slot_coaches` c ON c.`slot_id` = s.`id`
		WHERE n.`id` = NEW.`slot_id` AND n.`cancelled_at` IS NULL AND c.`person_id` = NEW.`person_id` AND s.`id` <> n.`id` AND s.`cancelled_at` IS NULL
		AND NOT (c.`slot_id` = OLD.`slot_id` AND c.`person_id` = OLD.`person_id`)
		AND s.`starts_at` < n.`ends_at` AND s.`starts_at` > n.`starts_at` - 43200000 AND s.`ends_at` > n.`starts_at`
		AND NOT EXISTS (SELECT 1 FROM `clash_overrides` o WHERE o.`slot_uid` = n.`uid` AND o.`kind` = 'coach')
	);
END;
--> statement-breakpoint
CREATE TRIGGER `slots_coach_free_update` BEFORE UPDATE OF `starts_at`, `ends_at`, `cancelled_at` ON `slots` WHEN NEW.`cancelled_at` IS NULL
BEGIN
	SELECT RAISE(ABORT, 'coach-overlap') WHERE EXISTS (
		SELECT 1 FROM `slot_coaches` m JOIN `slot_coaches` c ON c.`person_id` = m.`person_id` JOIN `slots` s ON s.`id` = c.`slot_id`
		WHERE m.`slot_id` = NEW.`id` AND s.`id` <> NEW.`id` AND s.`cancelled_at` IS NULL
		AND s.`starts_at` < NEW.`ends_at` AND s.`starts_at` > NEW.`starts_at` - 43200000 AND s.`ends_at` > NEW.`starts_at`
	) AND NOT EXISTS (SELECT 1 FROM `clash_overrides` o WHERE o.`slot_uid` = NEW.`uid` AND o.`kind` = 'coach');
END;
--> statement-breakpoint
-- What was written once stays as written.
CREATE TRIGGER `session_revisions_immutable` BEFORE UPDATE ON `session_revisions` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `session_revisions_kept` BEFORE DELETE ON `session_revisions` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `audit_entries_immutable` BEFORE UPDATE ON `audit_entries` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `audit_entries_kept` BEFORE DELETE ON `audit_entries` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `booking_changes_immutable` BEFORE UPDATE ON `booking_changes` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `booking_changes_kept` BEFORE DELETE ON `booking_changes` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `ledger_transfers_immutable` BEFORE UPDATE ON `ledger_transfers` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `ledger_transfers_kept` BEFORE DELETE ON `ledger_transfers` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `ledger_entries_immutable` BEFORE UPDATE ON `ledger_entries` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
CREATE TRIGGER `ledger_entries_kept` BEFORE DELETE ON `ledger_entries` BEGIN SELECT RAISE(ABORT, 'append-only'); END;
--> statement-breakpoint
-- A pack never pays for more than it holds.
CREATE TRIGGER `ledger_entries_covered` AFTER INSERT ON `ledger_entries` WHEN NEW.`amount` < 0 AND NEW.`account` LIKE 'pass:%'
BEGIN
	SELECT RAISE(ABORT, 'pass-overdrawn') WHERE (
		SELECT sum(`amount`) FROM `ledger_entries` WHERE `account` = NEW.`account` AND `unit` = NEW.`unit`
	) < 0;
END;
--> statement-breakpoint
-- One row for pieces of the same group, load and home.
CREATE UNIQUE INDEX `kit_items_same` ON `kit_items` (`kit_group_id`, coalesce(`load_kg`, -1), coalesce(`room_id`, 0)) WHERE `archived_at` IS NULL;
