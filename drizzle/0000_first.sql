CREATE TABLE `assignments` (
	`id` text PRIMARY KEY NOT NULL,
	`class_id` text NOT NULL,
	`title` text NOT NULL,
	`brief` text NOT NULL,
	`song_id` text NOT NULL,
	`due_at` integer NOT NULL,
	`late_rule` text NOT NULL,
	`requirements` text NOT NULL,
	`rubric` text NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`class_id`) REFERENCES `classes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`song_id`) REFERENCES `songs`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `assignments_class` ON `assignments` (`class_id`);--> statement-breakpoint
CREATE TABLE `class_teachers` (
	`class_id` text NOT NULL,
	`user_id` text NOT NULL,
	PRIMARY KEY(`class_id`, `user_id`),
	FOREIGN KEY (`class_id`) REFERENCES `classes`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `class_teachers_user` ON `class_teachers` (`user_id`);--> statement-breakpoint
CREATE TABLE `classes` (
	`id` text PRIMARY KEY NOT NULL,
	`school_id` text NOT NULL,
	`name` text NOT NULL,
	`code` text NOT NULL,
	FOREIGN KEY (`school_id`) REFERENCES `schools`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `classes_code_unique` ON `classes` (`code`);--> statement-breakpoint
CREATE TABLE `enrolments` (
	`class_id` text NOT NULL,
	`user_id` text NOT NULL,
	PRIMARY KEY(`class_id`, `user_id`),
	FOREIGN KEY (`class_id`) REFERENCES `classes`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `enrolments_user` ON `enrolments` (`user_id`);--> statement-breakpoint
CREATE TABLE `exercise_attempts` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`lesson_id` text NOT NULL,
	`step_id` text NOT NULL,
	`at` integer NOT NULL,
	`passed` integer NOT NULL,
	`problem_code` text,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `exercise_attempts_user` ON `exercise_attempts` (`user_id`,`lesson_id`);--> statement-breakpoint
CREATE TABLE `lesson_progress` (
	`user_id` text NOT NULL,
	`lesson_id` text NOT NULL,
	`lesson_version` integer NOT NULL,
	`step_id` text NOT NULL,
	`is_done` integer DEFAULT false NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`answer` integer,
	`source` text,
	`updated_at` integer NOT NULL,
	PRIMARY KEY(`user_id`, `lesson_id`, `step_id`),
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `beat_maps` (
	`id` text PRIMARY KEY NOT NULL,
	`song_id` text NOT NULL,
	`number` integer NOT NULL,
	`beat_map` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`song_id`) REFERENCES `songs`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `consents` (
	`user_id` text PRIMARY KEY NOT NULL,
	`is_name_public` integer NOT NULL,
	`recorded_by` text,
	`recorded_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`recorded_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `forwards` (
	`id` text PRIMARY KEY NOT NULL,
	`submission_id` text NOT NULL,
	`version_id` text NOT NULL,
	`note` text NOT NULL,
	`forwarded_by` text NOT NULL,
	`forwarded_at` integer NOT NULL,
	`state` text NOT NULL,
	`answer` text,
	`answered_by` text,
	`answered_at` integer,
	FOREIGN KEY (`forwarded_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`answered_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `forwards_submission` ON `forwards` (`submission_id`);--> statement-breakpoint
CREATE TABLE `lineup_publications` (
	`id` text PRIMARY KEY NOT NULL,
	`season_id` text NOT NULL,
	`number` integer NOT NULL,
	`nights` text NOT NULL,
	`slots` text NOT NULL,
	`published_by` text NOT NULL,
	`published_at` integer NOT NULL,
	FOREIGN KEY (`season_id`) REFERENCES `seasons`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`published_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `nights` (
	`id` text PRIMARY KEY NOT NULL,
	`season_id` text NOT NULL,
	`date` text NOT NULL,
	`opens_at` text NOT NULL,
	`closes_at` text NOT NULL,
	`closed_reason` text,
	FOREIGN KEY (`season_id`) REFERENCES `seasons`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `nights_date` ON `nights` (`season_id`,`date`);--> statement-breakpoint
CREATE TABLE `seasons` (
	`id` text PRIMARY KEY NOT NULL,
	`square_id` text NOT NULL,
	`name` text NOT NULL,
	`first_date` text NOT NULL,
	`last_date` text NOT NULL,
	`times` text NOT NULL,
	FOREIGN KEY (`square_id`) REFERENCES `squares`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `slots` (
	`id` text PRIMARY KEY NOT NULL,
	`night_id` text NOT NULL,
	`starts_at` text NOT NULL,
	`forward_id` text NOT NULL,
	`is_pinned` integer DEFAULT false NOT NULL,
	FOREIGN KEY (`night_id`) REFERENCES `nights`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`forward_id`) REFERENCES `forwards`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `slots_time` ON `slots` (`night_id`,`starts_at`);--> statement-breakpoint
CREATE TABLE `song_files` (
	`id` text PRIMARY KEY NOT NULL,
	`song_id` text NOT NULL,
	`media_type` text NOT NULL,
	`bytes` blob NOT NULL,
	FOREIGN KEY (`song_id`) REFERENCES `songs`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `songs` (
	`id` text PRIMARY KEY NOT NULL,
	`title` text NOT NULL,
	`credit` text NOT NULL,
	`current_beat_map_id` text
);
--> statement-breakpoint
CREATE UNIQUE INDEX `songs_title_unique` ON `songs` (`title`);--> statement-breakpoint
CREATE TABLE `square_layouts` (
	`id` text PRIMARY KEY NOT NULL,
	`square_id` text NOT NULL,
	`number` integer NOT NULL,
	`hash` text NOT NULL,
	`layout` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`square_id`) REFERENCES `squares`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `square_layouts_number` ON `square_layouts` (`square_id`,`number`);--> statement-breakpoint
CREATE TABLE `squares` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`town_name` text NOT NULL,
	`event_name` text NOT NULL,
	`time_zone` text NOT NULL,
	`current_layout_id` text
);
--> statement-breakpoint
CREATE TABLE `audit_log` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`at` integer NOT NULL,
	`actor_id` text,
	`event` text NOT NULL,
	`subject` text,
	`detail` text,
	`hash` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `schools` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`short_name` text NOT NULL,
	`time_zone` text NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `schools_name_unique` ON `schools` (`name`);--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`expires_at` integer NOT NULL,
	`ends_at` integer NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE TABLE `sign_in_failures` (
	`account_key` text PRIMARY KEY NOT NULL,
	`count` integer NOT NULL,
	`last_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `sign_in_resets` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`code_hash` text NOT NULL,
	`expires_at` integer NOT NULL,
	`used_at` integer,
	`made_by` text NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`made_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `user_roles` (
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	PRIMARY KEY(`user_id`, `role`),
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `users` (
	`id` text PRIMARY KEY NOT NULL,
	`school_id` text,
	`display_name` text NOT NULL,
	`username` text,
	`email` text,
	`secret_hash` text,
	`is_disabled` integer DEFAULT false NOT NULL,
	`created_at` integer NOT NULL,
	`last_seen_at` integer,
	FOREIGN KEY (`school_id`) REFERENCES `schools`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `users_email` ON `users` (lower("email"));--> statement-breakpoint
CREATE INDEX `users_username` ON `users` (`username`);--> statement-breakpoint
CREATE TABLE `comments` (
	`id` text PRIMARY KEY NOT NULL,
	`submission_id` text NOT NULL,
	`version_id` text NOT NULL,
	`author_id` text NOT NULL,
	`anchor` text NOT NULL,
	`body` text NOT NULL,
	`created_at` integer NOT NULL,
	`deleted_at` integer,
	FOREIGN KEY (`submission_id`) REFERENCES `submissions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`version_id`) REFERENCES `show_versions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`author_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `comments_submission` ON `comments` (`submission_id`);--> statement-breakpoint
CREATE TABLE `drafts` (
	`show_id` text PRIMARY KEY NOT NULL,
	`revision` integer NOT NULL,
	`source` text NOT NULL,
	`saved_at` integer NOT NULL,
	`saved_by` text,
	`ribbon` blob,
	FOREIGN KEY (`show_id`) REFERENCES `shows`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`saved_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `idempotency_keys` (
	`user_id` text NOT NULL,
	`key` text NOT NULL,
	`request_hash` text NOT NULL,
	`status` integer NOT NULL,
	`response` text NOT NULL,
	`created_at` integer NOT NULL,
	PRIMARY KEY(`user_id`, `key`),
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `idempotency_keys_age` ON `idempotency_keys` (`created_at`);--> statement-breakpoint
CREATE TABLE `marks` (
	`submission_id` text PRIMARY KEY NOT NULL,
	`levels` text NOT NULL,
	`note` text NOT NULL,
	`marked_by` text NOT NULL,
	`saved_at` integer NOT NULL,
	`released_at` integer,
	FOREIGN KEY (`submission_id`) REFERENCES `submissions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`marked_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `runs` (
	`id` text PRIMARY KEY NOT NULL,
	`version_id` text NOT NULL,
	`layout_id` text NOT NULL,
	`beat_map_id` text NOT NULL,
	`engine` text NOT NULL,
	`rules_version` integer NOT NULL,
	`summary` text NOT NULL,
	`hash` text,
	`timeline` blob,
	`ribbon` blob,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`version_id`) REFERENCES `show_versions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`layout_id`) REFERENCES `square_layouts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`beat_map_id`) REFERENCES `beat_maps`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `runs_version` ON `runs` (`version_id`,`created_at`);--> statement-breakpoint
CREATE TABLE `show_authors` (
	`show_id` text NOT NULL,
	`user_id` text NOT NULL,
	PRIMARY KEY(`show_id`, `user_id`),
	FOREIGN KEY (`show_id`) REFERENCES `shows`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `show_authors_user` ON `show_authors` (`user_id`);--> statement-breakpoint
CREATE TABLE `show_versions` (
	`id` text PRIMARY KEY NOT NULL,
	`show_id` text NOT NULL,
	`number` integer NOT NULL,
	`source` text NOT NULL,
	`seed` integer NOT NULL,
	`language` integer NOT NULL,
	`song_id` text NOT NULL,
	`layout_id` text NOT NULL,
	`beat_map_id` text NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`show_id`) REFERENCES `shows`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`song_id`) REFERENCES `songs`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`layout_id`) REFERENCES `square_layouts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`beat_map_id`) REFERENCES `beat_maps`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `show_versions_number` ON `show_versions` (`show_id`,`number`);--> statement-breakpoint
CREATE TABLE `shows` (
	`id` text PRIMARY KEY NOT NULL,
	`title` text NOT NULL,
	`song_id` text NOT NULL,
	`assignment_id` text,
	`seed` integer NOT NULL,
	`is_archived` integer DEFAULT false NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`song_id`) REFERENCES `songs`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`assignment_id`) REFERENCES `assignments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `shows_assignment` ON `shows` (`assignment_id`);--> statement-breakpoint
CREATE TABLE `submission_events` (
	`id` text PRIMARY KEY NOT NULL,
	`submission_id` text NOT NULL,
	`version_id` text NOT NULL,
	`state` text NOT NULL,
	`by` text NOT NULL,
	`note` text,
	`at` integer NOT NULL,
	FOREIGN KEY (`submission_id`) REFERENCES `submissions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`version_id`) REFERENCES `show_versions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `submission_events_submission` ON `submission_events` (`submission_id`);--> statement-breakpoint
CREATE TABLE `submissions` (
	`id` text PRIMARY KEY NOT NULL,
	`assignment_id` text NOT NULL,
	`show_id` text NOT NULL,
	`version_id` text NOT NULL,
	`state` text NOT NULL,
	`handed_in_at` integer NOT NULL,
	`is_late` integer NOT NULL,
	`hashes_agree` integer,
	FOREIGN KEY (`assignment_id`) REFERENCES `assignments`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`show_id`) REFERENCES `shows`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`version_id`) REFERENCES `show_versions`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `submissions_show` ON `submissions` (`assignment_id`,`show_id`);