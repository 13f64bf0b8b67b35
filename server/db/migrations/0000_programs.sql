CREATE TABLE `programs` (
	`id` integer PRIMARY KEY NOT NULL,
	`sha256` text NOT NULL,
	`mark` text NOT NULL,
	`file_name` text NOT NULL,
	`text` text NOT NULL,
	`spec` text NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `programs_sha256_unique` ON `programs` (`sha256`);--> statement-breakpoint
CREATE INDEX `programs_mark` ON `programs` (`mark`);