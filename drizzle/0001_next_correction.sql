ALTER TABLE `article` ADD `next_correction_kind` enum('correction','clarification','update','withdrawal');--> statement-breakpoint
ALTER TABLE `article` ADD `next_correction_body` text;--> statement-breakpoint
ALTER TABLE `article` ADD CONSTRAINT `article_next_correction` CHECK ((`article`.`next_correction_kind` is null) = (`article`.`next_correction_body` is null));