CREATE TABLE `passkeys` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`person_id` text NOT NULL,
	`name` text NOT NULL,
	`public_key` text NOT NULL,
	`counter` integer NOT NULL,
	`backed_up` integer NOT NULL,
	`transports` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `passkeys_person` ON `passkeys` (`person_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`role` text NOT NULL,
	`status` text DEFAULT 'active' NOT NULL,
	`name` text NOT NULL,
	`email` text,
	`password_hash` text,
	`epoch` integer DEFAULT 0 NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email_unique` ON `people` (`email`);--> statement-breakpoint
CREATE INDEX `people_shop` ON `people` (`shop_id`);--> statement-breakpoint
CREATE TABLE `shops` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`demo` integer DEFAULT false NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `tokens` (
	`hash` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`shop_id` text,
	`person_id` text,
	`payload` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `tokens_shop` ON `tokens` (`shop_id`);--> statement-breakpoint
CREATE INDEX `tokens_expiry` ON `tokens` (`expires_at`);--> statement-breakpoint
CREATE TABLE `bit_corrections` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`bit_id` text NOT NULL,
	`units` text NOT NULL,
	`diameter` real NOT NULL,
	`spread` real NOT NULL,
	`count` integer NOT NULL,
	`accepted_by` text NOT NULL,
	`accepted_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`bit_id`) REFERENCES `bits`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`accepted_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `bit_corrections_bit` ON `bit_corrections` (`bit_id`,`accepted_at`);--> statement-breakpoint
CREATE TABLE `bit_replacements` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`bit_id` text NOT NULL,
	`replaced_by` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`bit_id`) REFERENCES `bits`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`replaced_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `bit_replacements_bit` ON `bit_replacements` (`bit_id`,`at`);--> statement-breakpoint
CREATE TABLE `bits` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`name` text COLLATE NOCASE NOT NULL,
	`spec` text NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `bits_name` ON `bits` (`shop_id`,`name`);--> statement-breakpoint
CREATE INDEX `bits_time` ON `bits` (`shop_id`,`updated_at`);--> statement-breakpoint
CREATE TABLE `machines` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`name` text COLLATE NOCASE NOT NULL,
	`spec` text NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `machines_name` ON `machines` (`shop_id`,`name`);--> statement-breakpoint
CREATE INDEX `machines_time` ON `machines` (`shop_id`,`updated_at`);--> statement-breakpoint
CREATE TABLE `woods` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`name` text COLLATE NOCASE NOT NULL,
	`spec` text NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `woods_name` ON `woods` (`shop_id`,`name`);--> statement-breakpoint
CREATE INDEX `woods_time` ON `woods` (`shop_id`,`updated_at`);--> statement-breakpoint
CREATE TABLE `rail_programs` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`rail_id` text NOT NULL,
	`revision` integer NOT NULL,
	`machine_id` text NOT NULL,
	`bit_id` text NOT NULL,
	`mark` text NOT NULL,
	`sha256` text NOT NULL,
	`file_name` text NOT NULL,
	`text` text NOT NULL,
	`spec` text NOT NULL,
	`machine` text NOT NULL,
	`bit` text NOT NULL,
	`holding` integer NOT NULL,
	`readback` text NOT NULL,
	`summary` text NOT NULL,
	`made_by` text NOT NULL,
	`made_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`rail_id`) REFERENCES `rails`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`machine_id`) REFERENCES `machines`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`bit_id`) REFERENCES `bits`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`made_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `rail_programs_shop` ON `rail_programs` (`shop_id`,`made_at`);--> statement-breakpoint
CREATE INDEX `rail_programs_mark` ON `rail_programs` (`shop_id`,`mark`);--> statement-breakpoint
CREATE INDEX `rail_programs_rail` ON `rail_programs` (`rail_id`,`revision`);--> statement-breakpoint
CREATE TABLE `rail_revisions` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`rail_id` text NOT NULL,
	`number` integer NOT NULL,
	`draft` text NOT NULL,
	`request` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`saved_by` text NOT NULL,
	`saved_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`rail_id`) REFERENCES `rails`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`saved_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `rail_revisions_number` ON `rail_revisions` (`rail_id`,`number`);--> statement-breakpoint
CREATE INDEX `rail_revisions_shop` ON `rail_revisions` (`shop_id`);--> statement-breakpoint
CREATE TABLE `rails` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`name` text COLLATE NOCASE NOT NULL,
	`status` text NOT NULL,
	`revision` integer NOT NULL,
	`wood` text NOT NULL,
	`quantity` integer DEFAULT 1 NOT NULL,
	`due` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `rails_shop` ON `rails` (`shop_id`,`updated_at`);--> statement-breakpoint
CREATE INDEX `rails_status` ON `rails` (`shop_id`,`status`);--> statement-breakpoint
CREATE INDEX `rails_name` ON `rails` (`shop_id`,`name`);--> statement-breakpoint
CREATE TABLE `cuts` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`rail_id` text NOT NULL,
	`program_id` text NOT NULL,
	`machine_id` text NOT NULL,
	`bit_id` text NOT NULL,
	`person_id` text NOT NULL,
	`outcome` text NOT NULL,
	`reason` text DEFAULT '' NOT NULL,
	`seconds` real,
	`widths` text NOT NULL,
	`depths` text NOT NULL,
	`cut_at` integer NOT NULL,
	`logged_at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`rail_id`) REFERENCES `rails`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`program_id`) REFERENCES `rail_programs`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`machine_id`) REFERENCES `machines`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`bit_id`) REFERENCES `bits`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `cuts_shop` ON `cuts` (`shop_id`,`cut_at`);--> statement-breakpoint
CREATE INDEX `cuts_rail` ON `cuts` (`rail_id`);--> statement-breakpoint
CREATE INDEX `cuts_bit` ON `cuts` (`bit_id`);--> statement-breakpoint
CREATE INDEX `cuts_program` ON `cuts` (`program_id`);--> statement-breakpoint
CREATE TABLE `deeds` (
	`id` integer PRIMARY KEY NOT NULL,
	`shop_id` text NOT NULL,
	`person_id` text,
	`what` text NOT NULL,
	`subject` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `deeds_shop` ON `deeds` (`shop_id`,`at`);--> statement-breakpoint
CREATE TABLE `mails` (
	`id` text PRIMARY KEY NOT NULL,
	`shop_id` text,
	`to` text NOT NULL,
	`subject` text NOT NULL,
	`text` text NOT NULL,
	`html` text NOT NULL,
	`created_at` integer NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`next_at` integer,
	`sent_at` integer,
	`refusal` text,
	FOREIGN KEY (`shop_id`) REFERENCES `shops`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `mails_next` ON `mails` (`next_at`);--> statement-breakpoint
CREATE INDEX `mails_shop` ON `mails` (`shop_id`,`created_at`);
--> statement-breakpoint
CREATE TRIGGER `programs_no_update` BEFORE UPDATE ON `programs` BEGIN SELECT RAISE(ABORT, 'a program once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `programs_no_delete` BEFORE DELETE ON `programs` BEGIN SELECT RAISE(ABORT, 'a program once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `rail_programs_no_update` BEFORE UPDATE ON `rail_programs` BEGIN SELECT RAISE(ABORT, 'a program once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `rail_programs_no_delete` BEFORE DELETE ON `rail_programs` BEGIN SELECT RAISE(ABORT, 'a program once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `rail_revisions_no_update` BEFORE UPDATE ON `rail_revisions` BEGIN SELECT RAISE(ABORT, 'a revision once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `rail_revisions_no_delete` BEFORE DELETE ON `rail_revisions` BEGIN SELECT RAISE(ABORT, 'a revision once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `cuts_no_update` BEFORE UPDATE ON `cuts` BEGIN SELECT RAISE(ABORT, 'a cut once kept is never changed'); END;
--> statement-breakpoint
CREATE TRIGGER `cuts_no_delete` BEFORE DELETE ON `cuts` BEGIN SELECT RAISE(ABORT, 'a cut once kept is never changed'); END;
