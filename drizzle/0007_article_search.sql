-- The newest text of what was written before there was a search, then its index.
INSERT INTO `article_text` (`article_id`, `title`, `standfirst`, `source`)
SELECT `article`.`id`, `revision`.`title`, `revision`.`standfirst`, `revision`.`source`
FROM `article`
INNER JOIN `revision` ON `revision`.`article_id` = `article`.`id` AND `revision`.`number` = `article`.`head`;
--> statement-breakpoint
CREATE FULLTEXT INDEX `article_text_words` ON `article_text` (`title`, `standfirst`, `source`);
