CREATE TABLE `bench_ticks` (
	`id` integer PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`commission_id` text NOT NULL,
	`step` text NOT NULL,
	`done` integer NOT NULL,
	`ticked_by` text NOT NULL,
	`ticked_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`commission_id`) REFERENCES `commissions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`ticked_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `bench_ticks_commission` ON `bench_ticks` (`commission_id`);--> statement-breakpoint
CREATE INDEX `bench_ticks_shop` ON `bench_ticks` (`shop_id`);--> statement-breakpoint
CREATE TABLE `commissions` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`name` text COLLATE NOCASE NOT NULL,
	`contact` text NOT NULL,
	`occasion` text DEFAULT '' NOT NULL,
	`wall` text DEFAULT '' NOT NULL,
	`due` text,
	`stage` text DEFAULT 'enquiry' NOT NULL,
	`stage_days` text NOT NULL,
	`units` text NOT NULL,
	`wishes` text DEFAULT '' NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `commissions_shop` ON `commissions` (`shop_id`,`updated_at`);--> statement-breakpoint
CREATE INDEX `commissions_name` ON `commissions` (`shop_id`,`name`);--> statement-breakpoint
CREATE INDEX `commissions_due` ON `commissions` (`shop_id`,`due`);--> statement-breakpoint
CREATE TABLE `made_steps` (
	`id` integer PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`commission_id` text NOT NULL,
	`step` text NOT NULL,
	`revision` integer NOT NULL,
	`made_by` text NOT NULL,
	`made_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`commission_id`) REFERENCES `commissions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`made_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `made_steps_commission` ON `made_steps` (`commission_id`,`step`);--> statement-breakpoint
CREATE INDEX `made_steps_shop` ON `made_steps` (`shop_id`);--> statement-breakpoint
CREATE TABLE `piece_revisions` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`commission_id` text NOT NULL,
	`number` integer NOT NULL,
	`work` text NOT NULL,
	`saved_by` text NOT NULL,
	`saved_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`commission_id`) REFERENCES `commissions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`saved_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `piece_revisions_number` ON `piece_revisions` (`commission_id`,`number`);--> statement-breakpoint
CREATE INDEX `piece_revisions_shop` ON `piece_revisions` (`shop_id`);--> statement-breakpoint
ALTER TABLE `rails` ADD `commission_id` text REFERENCES commissions(id);--> statement-breakpoint
ALTER TABLE `rails` ADD `label` text;--> statement-breakpoint
CREATE UNIQUE INDEX `rails_label` ON `rails` (`commission_id`,`label`) WHERE archived_at IS NULL;
--> statement-breakpoint
CREATE TRIGGER `piece_revisions_no_update` BEFORE UPDATE ON `piece_revisions` BEGIN SELECT RAISE(ABORT, 'a revision once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `piece_revisions_no_delete` BEFORE DELETE ON `piece_revisions` BEGIN SELECT RAISE(ABORT, 'a revision once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `made_steps_no_update` BEFORE UPDATE ON `made_steps` BEGIN SELECT RAISE(ABORT, 'what was made once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `made_steps_no_delete` BEFORE DELETE ON `made_steps` BEGIN SELECT RAISE(ABORT, 'what was made once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `bench_ticks_no_update` BEFORE UPDATE ON `bench_ticks` BEGIN SELECT RAISE(ABORT, 'a tick once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `bench_ticks_no_delete` BEFORE DELETE ON `bench_ticks` BEGIN SELECT RAISE(ABORT, 'a tick once kept is never changed'); END;