CREATE TABLE `stripe_events` (
	`id` text PRIMARY KEY NOT NULL,
	`type` text NOT NULL,
	`happened_at` integer NOT NULL,
	`payload` text NOT NULL,
	`received_at` integer NOT NULL,
	`acted_at` integer
);
--> statement-breakpoint
CREATE INDEX `stripe_events_to_act` ON `stripe_events` (`acted_at`,`happened_at`);