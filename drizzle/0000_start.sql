CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`expires_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE TABLE `chemistry_versions` (
	`id` text PRIMARY KEY NOT NULL,
	`created_at` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `library_rows` (
	`version` text NOT NULL,
	`table_name` text NOT NULL,
	`position` integer NOT NULL,
	`row` text NOT NULL,
	PRIMARY KEY(`version`, `table_name`, `position`),
	FOREIGN KEY (`version`) REFERENCES `chemistry_versions`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `species_rows` (
	`version` text NOT NULL,
	`position` integer NOT NULL,
	`id` text NOT NULL,
	`formula` text NOT NULL,
	`name` text NOT NULL,
	`phase` text NOT NULL,
	`charge` integer NOT NULL,
	`composition` text NOT NULL,
	`dGf_kJ` real NOT NULL,
	`dHf_kJ` real,
	`S_J` real,
	`Cp_J` real,
	`Cp_a` real,
	`Cp_b` real,
	`Cp_c` real,
	`Cp_Tmax_K` real,
	`ion_class` text,
	`grade` text NOT NULL,
	`source` text NOT NULL,
	`note` text NOT NULL,
	PRIMARY KEY(`version`, `id`),
	FOREIGN KEY (`version`) REFERENCES `chemistry_versions`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `species_rows_order` ON `species_rows` (`version`,`position`);--> statement-breakpoint
CREATE TABLE `users` (
	`id` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`role` text NOT NULL,
	`password_hash` text NOT NULL,
	`preferences` text NOT NULL,
	`created_at` text NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `users_email_unique` ON `users` (`email`);--> statement-breakpoint
CREATE TABLE `plan_revisions` (
	`plan_id` text NOT NULL,
	`number` integer NOT NULL,
	`note` text NOT NULL,
	`author_id` text NOT NULL,
	`created_at` text NOT NULL,
	`data_version` text NOT NULL,
	`inputs` text NOT NULL,
	PRIMARY KEY(`plan_id`, `number`),
	FOREIGN KEY (`plan_id`) REFERENCES `plans`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`author_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`data_version`) REFERENCES `chemistry_versions`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `plans` (
	`id` text PRIMARY KEY NOT NULL,
	`project_id` text NOT NULL,
	`name` text NOT NULL,
	`description` text NOT NULL,
	`archived` integer DEFAULT false NOT NULL,
	`invented` integer DEFAULT false NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` text NOT NULL,
	`updated_at` text NOT NULL,
	FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `plans_project` ON `plans` (`project_id`);--> statement-breakpoint
CREATE TABLE `projects` (
	`id` text PRIMARY KEY NOT NULL,
	`site_name` text NOT NULL,
	`name` text NOT NULL,
	`invented` integer DEFAULT false NOT NULL,
	`created_at` text NOT NULL
);
