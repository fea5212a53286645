CREATE TABLE `article_presence` (
	`article_id` int NOT NULL,
	`person_id` varchar(36) NOT NULL,
	`last_key_at` datetime(3),
	`seen_at` datetime(3) NOT NULL,
	CONSTRAINT `article_presence_article_id_person_id_pk` PRIMARY KEY(`article_id`,`person_id`)
);
--> statement-breakpoint
CREATE TABLE `edition_picture` (
	`edition_id` int NOT NULL,
	`sha256` char(64) NOT NULL,
	CONSTRAINT `edition_picture_edition_id_sha256_pk` PRIMARY KEY(`edition_id`,`sha256`)
);
--> statement-breakpoint
CREATE TABLE `picture` (
	`sha256` char(64) NOT NULL,
	`upload_sha256` char(64) NOT NULL,
	`width` int NOT NULL,
	`height` int NOT NULL,
	`mime` varchar(40) NOT NULL,
	`bytes` int NOT NULL,
	`fallback` enum('jpg','png') NOT NULL,
	`alt` varchar(500) NOT NULL DEFAULT '',
	`credit` varchar(200) NOT NULL DEFAULT '',
	`file_name` varchar(200) NOT NULL DEFAULT '',
	`stored_by` varchar(36) NOT NULL,
	`stored_at` datetime(3) NOT NULL,
	CONSTRAINT `picture_sha256` PRIMARY KEY(`sha256`),
	CONSTRAINT `picture_upload` UNIQUE(`upload_sha256`)
);
--> statement-breakpoint
ALTER TABLE `revision` ADD `label` varchar(80);--> statement-breakpoint
ALTER TABLE `revision` ADD `words_added` int;--> statement-breakpoint
ALTER TABLE `revision` ADD `words_removed` int;--> statement-breakpoint
ALTER TABLE `article_presence` ADD CONSTRAINT `article_presence_article_id_article_id_fk` FOREIGN KEY (`article_id`) REFERENCES `article`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `article_presence` ADD CONSTRAINT `article_presence_person_id_user_id_fk` FOREIGN KEY (`person_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_picture` ADD CONSTRAINT `edition_picture_edition_id_edition_id_fk` FOREIGN KEY (`edition_id`) REFERENCES `edition`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_picture` ADD CONSTRAINT `edition_picture_sha256_picture_sha256_fk` FOREIGN KEY (`sha256`) REFERENCES `picture`(`sha256`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `picture` ADD CONSTRAINT `picture_stored_by_user_id_fk` FOREIGN KEY (`stored_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `article_presence_seen` ON `article_presence` (`seen_at`);--> statement-breakpoint
CREATE INDEX `edition_picture_picture` ON `edition_picture` (`sha256`);--> statement-breakpoint
CREATE INDEX `picture_stored` ON `picture` (`stored_at`);--> statement-breakpoint
CREATE INDEX `revision_label` ON `revision` (`article_id`,`label`);