CREATE TABLE `draft_history` (
	`show_id` text NOT NULL,
	`revision` integer NOT NULL,
	`source` text NOT NULL,
	`began_at` integer NOT NULL,
	`saved_at` integer NOT NULL,
	`saved_by` text,
	`ribbon` blob,
	PRIMARY KEY(`show_id`, `revision`),
	FOREIGN KEY (`show_id`) REFERENCES `shows`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`saved_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
