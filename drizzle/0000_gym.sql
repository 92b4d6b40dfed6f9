CREATE TABLE `audit_entries` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`at` integer NOT NULL,
	`actor_id` integer,
	`verb` text NOT NULL,
	`noun` text NOT NULL,
	`noun_id` integer,
	`detail` text DEFAULT '{}' NOT NULL,
	FOREIGN KEY (`actor_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `audit_entries_at` ON `audit_entries` (`at`);--> statement-breakpoint
CREATE INDEX `audit_entries_noun` ON `audit_entries` (`noun`,`noun_id`);--> statement-breakpoint
CREATE INDEX `audit_entries_actor` ON `audit_entries` (`actor_id`);--> statement-breakpoint
CREATE TABLE `booking_changes` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`booking_id` integer NOT NULL,
	`from_status` text,
	`to_status` text NOT NULL,
	`at` integer NOT NULL,
	`by_id` integer,
	`why` text,
	FOREIGN KEY (`booking_id`) REFERENCES `bookings`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `booking_changes_booking` ON `booking_changes` (`booking_id`);--> statement-breakpoint
CREATE TABLE `bookings` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`slot_id` integer NOT NULL,
	`person_id` integer NOT NULL,
	`status` text NOT NULL,
	`queue_rank` real,
	`variations` text DEFAULT '{}' NOT NULL,
	`loads` text DEFAULT '{}' NOT NULL,
	`note` text,
	`pass_id` integer,
	`complimentary_by_id` integer,
	`complimentary_why` text,
	`held_until` integer,
	`is_late` integer DEFAULT false NOT NULL,
	`is_walk_in` integer DEFAULT false NOT NULL,
	`checked_in_at` integer,
	`created_at` integer NOT NULL,
	`created_by_id` integer,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`slot_id`) REFERENCES `slots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`pass_id`) REFERENCES `passes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`complimentary_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "bookings_complimentary" CHECK(("bookings"."complimentary_by_id" is null) = ("bookings"."complimentary_why" is null)),
	CONSTRAINT "bookings_paid_once" CHECK("bookings"."pass_id" is null or "bookings"."complimentary_by_id" is null)
);
--> statement-breakpoint
CREATE UNIQUE INDEX `bookings_live` ON `bookings` (`slot_id`,`person_id`) WHERE "bookings"."status" in ('held','booked','waitlisted','attended','no-show');--> statement-breakpoint
CREATE INDEX `bookings_slot` ON `bookings` (`slot_id`,`status`);--> statement-breakpoint
CREATE INDEX `bookings_person` ON `bookings` (`person_id`,`slot_id`);--> statement-breakpoint
CREATE INDEX `bookings_pass` ON `bookings` (`pass_id`);--> statement-breakpoint
CREATE TABLE `idempotency_keys` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`person_id` integer NOT NULL,
	`key` text NOT NULL,
	`route` text NOT NULL,
	`body_hash` text NOT NULL,
	`status` integer NOT NULL,
	`answer` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `idempotency_keys_key` ON `idempotency_keys` (`person_id`,`key`);--> statement-breakpoint
CREATE INDEX `idempotency_keys_created` ON `idempotency_keys` (`created_at`);--> statement-breakpoint
CREATE TABLE `feeds` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`kind` text NOT NULL,
	`person_id` integer,
	`name` text NOT NULL,
	`token_hash` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by_id` integer,
	`last_read_at` integer,
	`revoked_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `feeds_token` ON `feeds` (`token_hash`);--> statement-breakpoint
CREATE INDEX `feeds_person` ON `feeds` (`person_id`);--> statement-breakpoint
CREATE TABLE `gyms` (
	`id` integer PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`place_name` text NOT NULL,
	`zone` text NOT NULL,
	`currency` text NOT NULL,
	`locale` text DEFAULT 'en-IE' NOT NULL,
	`load_unit` text DEFAULT 'kg' NOT NULL,
	`week_starts_on` integer DEFAULT 1 NOT NULL,
	`bells_wear_plate_colours` integer DEFAULT false NOT NULL,
	`library_version` integer DEFAULT 1 NOT NULL,
	`is_demo` integer DEFAULT false NOT NULL,
	`created_at` integer NOT NULL,
	CONSTRAINT "gyms_one_row" CHECK("gyms"."id" = 1),
	CONSTRAINT "gyms_week_start" CHECK("gyms"."week_starts_on" between 1 and 7)
);
--> statement-breakpoint
CREATE TABLE `rooms` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`name` text NOT NULL,
	`places` integer NOT NULL,
	`position` integer DEFAULT 0 NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL,
	CONSTRAINT "rooms_places" CHECK("rooms"."places" between 1 and 1000)
);
--> statement-breakpoint
CREATE UNIQUE INDEX `rooms_name` ON `rooms` (`name`);--> statement-breakpoint
CREATE TABLE `kit_groups` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`name` text NOT NULL,
	`plural` text NOT NULL,
	`has_loads` integer DEFAULT false NOT NULL,
	`position` integer DEFAULT 0 NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `kit_groups_name` ON `kit_groups` (`name`);--> statement-breakpoint
CREATE TABLE `kit_items` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`kit_group_id` integer NOT NULL,
	`load_kg` real,
	`count` integer NOT NULL,
	`room_id` integer,
	`note` text,
	`archived_at` integer,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`kit_group_id`) REFERENCES `kit_groups`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`room_id`) REFERENCES `rooms`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "kit_items_count" CHECK("kit_items"."count" between 0 and 1000),
	CONSTRAINT "kit_items_load" CHECK("kit_items"."load_kg" is null or ("kit_items"."load_kg" > 0 and "kit_items"."load_kg" <= 500))
);
--> statement-breakpoint
CREATE INDEX `kit_items_group` ON `kit_items` (`kit_group_id`);--> statement-breakpoint
CREATE TABLE `kit_spells` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`kit_item_id` integer NOT NULL,
	`count` integer NOT NULL,
	`from_at` integer NOT NULL,
	`to_at` integer,
	`why` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by_id` integer,
	FOREIGN KEY (`kit_item_id`) REFERENCES `kit_items`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "kit_spells_count" CHECK("kit_spells"."count" >= 1),
	CONSTRAINT "kit_spells_order" CHECK("kit_spells"."to_at" is null or "kit_spells"."to_at" > "kit_spells"."from_at")
);
--> statement-breakpoint
CREATE INDEX `kit_spells_item` ON `kit_spells` (`kit_item_id`);--> statement-breakpoint
CREATE TABLE `outbox_messages` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`kind` text NOT NULL,
	`fact_key` text NOT NULL,
	`person_id` integer,
	`to_address` text NOT NULL,
	`subject` text NOT NULL,
	`text` text NOT NULL,
	`html` text NOT NULL,
	`calendar` text,
	`calendar_method` text,
	`message_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`next_attempt_at` integer NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`claimed_at` integer,
	`sent_at` integer,
	`failed_at` integer,
	`last_error` text,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `outbox_messages_fact` ON `outbox_messages` (`fact_key`);--> statement-breakpoint
CREATE INDEX `outbox_messages_due` ON `outbox_messages` (`sent_at`,`failed_at`,`next_attempt_at`);--> statement-breakpoint
CREATE TABLE `movements` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`name` text NOT NULL,
	`pattern` text NOT NULL,
	`muscles` text NOT NULL,
	`per_side` integer DEFAULT false NOT NULL,
	`seconds_per_rep` real NOT NULL,
	`cues` text DEFAULT '' NOT NULL,
	`cautions` text DEFAULT '' NOT NULL,
	`always_needs_kit` integer DEFAULT false NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	CONSTRAINT "movements_seconds" CHECK("movements"."seconds_per_rep" > 0 and "movements"."seconds_per_rep" <= 120)
);
--> statement-breakpoint
CREATE UNIQUE INDEX `movements_name` ON `movements` (`name`);--> statement-breakpoint
CREATE INDEX `movements_pattern` ON `movements` (`pattern`);--> statement-breakpoint
CREATE TABLE `variation_needs` (
	`variation_id` integer NOT NULL,
	`kit_group_id` integer NOT NULL,
	`quantity` integer DEFAULT 1 NOT NULL,
	`people_per_piece` integer DEFAULT 1 NOT NULL,
	PRIMARY KEY(`variation_id`, `kit_group_id`),
	FOREIGN KEY (`variation_id`) REFERENCES `variations`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`kit_group_id`) REFERENCES `kit_groups`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "variation_needs_numbers" CHECK("variation_needs"."quantity" >= 1 and "variation_needs"."people_per_piece" >= 1),
	CONSTRAINT "variation_needs_sharing" CHECK("variation_needs"."quantity" = 1 or "variation_needs"."people_per_piece" = 1)
);
--> statement-breakpoint
CREATE TABLE `variations` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`movement_id` integer NOT NULL,
	`name` text NOT NULL,
	`rung` integer NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`movement_id`) REFERENCES `movements`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `variations_rung` ON `variations` (`movement_id`,`rung`) WHERE "variations"."archived_at" is null;--> statement-breakpoint
CREATE INDEX `variations_movement` ON `variations` (`movement_id`);--> statement-breakpoint
CREATE TABLE `ledger_entries` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`transfer_id` integer NOT NULL,
	`account` text NOT NULL,
	`unit` text NOT NULL,
	`amount` integer NOT NULL,
	FOREIGN KEY (`transfer_id`) REFERENCES `ledger_transfers`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "ledger_entries_amount" CHECK("ledger_entries"."amount" <> 0)
);
--> statement-breakpoint
CREATE INDEX `ledger_entries_account` ON `ledger_entries` (`account`,`unit`,`amount`);--> statement-breakpoint
CREATE INDEX `ledger_entries_transfer` ON `ledger_entries` (`transfer_id`);--> statement-breakpoint
CREATE TABLE `ledger_transfers` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`kind` text NOT NULL,
	`at` integer NOT NULL,
	`by_id` integer,
	`booking_id` integer,
	`reverses_id` integer,
	`why` text,
	FOREIGN KEY (`by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `ledger_transfers_booking` ON `ledger_transfers` (`booking_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `ledger_transfers_reverses` ON `ledger_transfers` (`reverses_id`);--> statement-breakpoint
CREATE TABLE `passes` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`person_id` integer NOT NULL,
	`kind` text NOT NULL,
	`name` text NOT NULL,
	`per_week` integer,
	`starts_on` text NOT NULL,
	`ends_on` text,
	`ended_at` integer,
	`price_cents` integer DEFAULT 0 NOT NULL,
	`note` text,
	`created_at` integer NOT NULL,
	`created_by_id` integer,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "passes_order" CHECK("passes"."ends_on" is null or "passes"."ends_on" >= "passes"."starts_on"),
	CONSTRAINT "passes_per_week" CHECK("passes"."per_week" is null or ("passes"."kind" = 'membership' and "passes"."per_week" >= 1))
);
--> statement-breakpoint
CREATE INDEX `passes_person` ON `passes` (`person_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`name` text NOT NULL,
	`email` text,
	`phone` text,
	`password_hash` text,
	`email_verified_at` integer,
	`note` text,
	`theme` text,
	`disabled_at` integer,
	`created_at` integer NOT NULL,
	`created_by_id` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email` ON `people` (`email`);--> statement-breakpoint
CREATE INDEX `people_name` ON `people` (`name`);--> statement-breakpoint
CREATE TABLE `person_roles` (
	`person_id` integer NOT NULL,
	`role` text NOT NULL,
	`granted_at` integer NOT NULL,
	`granted_by_id` integer,
	PRIMARY KEY(`person_id`, `role`),
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`granted_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `person_roles_role` ON `person_roles` (`role`);--> statement-breakpoint
CREATE TABLE `sign_in_links` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`expires_at` integer NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `sign_in_links_email` ON `sign_in_links` (`email`);--> statement-breakpoint
CREATE TABLE `sign_ins` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` integer NOT NULL,
	`created_at` integer NOT NULL,
	`last_seen_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`revoked_at` integer,
	`user_agent` text,
	`address` text,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `sign_ins_person` ON `sign_ins` (`person_id`);--> statement-breakpoint
CREATE TABLE `programmes` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`name` text NOT NULL,
	`aim` text DEFAULT '' NOT NULL,
	`position` integer DEFAULT 0 NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `programmes_name` ON `programmes` (`name`);--> statement-breakpoint
CREATE TABLE `session_revisions` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`training_session_id` integer NOT NULL,
	`number` integer NOT NULL,
	`content` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by_id` integer,
	FOREIGN KEY (`training_session_id`) REFERENCES `training_sessions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `session_revisions_number` ON `session_revisions` (`training_session_id`,`number`);--> statement-breakpoint
CREATE TABLE `training_sessions` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`programme_id` integer,
	`title` text NOT NULL,
	`length_min` integer NOT NULL,
	`revision_number` integer DEFAULT 0 NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL,
	`created_by_id` integer,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "training_sessions_length" CHECK("training_sessions"."length_min" between 5 and 480)
);
--> statement-breakpoint
CREATE INDEX `training_sessions_programme` ON `training_sessions` (`programme_id`);--> statement-breakpoint
CREATE TABLE `clash_overrides` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`slot_uid` text NOT NULL,
	`kind` text NOT NULL,
	`why` text NOT NULL,
	`at` integer NOT NULL,
	`by_id` integer NOT NULL,
	FOREIGN KEY (`by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `clash_overrides_slot` ON `clash_overrides` (`slot_uid`,`kind`);--> statement-breakpoint
CREATE TABLE `class_types` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`name` text NOT NULL,
	`about` text DEFAULT '' NOT NULL,
	`colour` text DEFAULT 'pine' NOT NULL,
	`length_min` integer NOT NULL,
	`programme_id` integer,
	`price_cents` integer DEFAULT 0 NOT NULL,
	`who_may_book` text DEFAULT 'anyone' NOT NULL,
	`opens_days_before` integer DEFAULT 28 NOT NULL,
	`closes_min_before` integer DEFAULT 0 NOT NULL,
	`cut_off_min` integer,
	`cut_off_clock` text,
	`people_per_coach` integer,
	`default_claims` text DEFAULT '[]' NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "class_types_length" CHECK("class_types"."length_min" between 5 and 480),
	CONSTRAINT "class_types_cut_off" CHECK(("class_types"."cut_off_min" is null) <> ("class_types"."cut_off_clock" is null))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `class_types_name` ON `class_types` (`name`);--> statement-breakpoint
CREATE TABLE `closures` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`room_id` integer,
	`from_on` text NOT NULL,
	`to_on` text NOT NULL,
	`why` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by_id` integer,
	`ended_at` integer,
	FOREIGN KEY (`room_id`) REFERENCES `rooms`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "closures_order" CHECK("closures"."to_on" >= "closures"."from_on")
);
--> statement-breakpoint
CREATE TABLE `publications` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`week_on` text NOT NULL,
	`at` integer NOT NULL,
	`by_id` integer NOT NULL,
	`slots` integer NOT NULL,
	`is_repeat` integer DEFAULT false NOT NULL,
	FOREIGN KEY (`by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `publications_week` ON `publications` (`week_on`);--> statement-breakpoint
CREATE TABLE `series` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`class_type_id` integer NOT NULL,
	`room_id` integer NOT NULL,
	`starts_on` text NOT NULL,
	`start_time` text NOT NULL,
	`length_min` integer NOT NULL,
	`rule` text NOT NULL,
	`set_places` integer,
	`split_from_id` integer,
	`ended_at` integer,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` integer NOT NULL,
	`created_by_id` integer,
	FOREIGN KEY (`class_type_id`) REFERENCES `class_types`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`room_id`) REFERENCES `rooms`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "series_length" CHECK("series"."length_min" between 5 and 480)
);
--> statement-breakpoint
CREATE INDEX `series_class_type` ON `series` (`class_type_id`);--> statement-breakpoint
CREATE TABLE `series_coaches` (
	`series_id` integer NOT NULL,
	`person_id` integer NOT NULL,
	`position` integer DEFAULT 0 NOT NULL,
	PRIMARY KEY(`series_id`, `person_id`),
	FOREIGN KEY (`series_id`) REFERENCES `series`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `slot_coaches` (
	`slot_id` integer NOT NULL,
	`person_id` integer NOT NULL,
	`position` integer DEFAULT 0 NOT NULL,
	PRIMARY KEY(`slot_id`, `person_id`),
	FOREIGN KEY (`slot_id`) REFERENCES `slots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `slot_coaches_person` ON `slot_coaches` (`person_id`);--> statement-breakpoint
CREATE TABLE `slots` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`uid` text NOT NULL,
	`series_id` integer,
	`recurrence_key` text,
	`kind` text DEFAULT 'class' NOT NULL,
	`class_type_id` integer NOT NULL,
	`room_id` integer NOT NULL,
	`starts_on` text NOT NULL,
	`start_time` text NOT NULL,
	`starts_at` integer NOT NULL,
	`ends_at` integer NOT NULL,
	`set_places` integer,
	`changed_at` integer,
	`session_revision_id` integer,
	`laid_at` integer,
	`session_published_at` integer,
	`cancelled_at` integer,
	`cancelled_by_id` integer,
	`cancel_reason` text,
	`sequence` integer DEFAULT 0 NOT NULL,
	`modified_at` integer NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`series_id`) REFERENCES `series`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`class_type_id`) REFERENCES `class_types`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`room_id`) REFERENCES `rooms`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`session_revision_id`) REFERENCES `session_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`cancelled_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "slots_order" CHECK("slots"."ends_at" > "slots"."starts_at" and "slots"."ends_at" <= "slots"."starts_at" + 43200000),
	CONSTRAINT "slots_key" CHECK(("slots"."series_id" is null) = ("slots"."recurrence_key" is null)),
	CONSTRAINT "slots_published" CHECK("slots"."session_published_at" is null or "slots"."session_revision_id" is not null)
);
--> statement-breakpoint
CREATE UNIQUE INDEX `slots_uid` ON `slots` (`uid`);--> statement-breakpoint
CREATE UNIQUE INDEX `slots_recurrence` ON `slots` (`series_id`,`recurrence_key`);--> statement-breakpoint
CREATE INDEX `slots_starts_at` ON `slots` (`starts_at`);--> statement-breakpoint
CREATE INDEX `slots_room` ON `slots` (`room_id`,`starts_at`);--> statement-breakpoint
CREATE INDEX `slots_revision` ON `slots` (`session_revision_id`);