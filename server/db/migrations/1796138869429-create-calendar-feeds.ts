import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Secret calendar addresses, one for each person and site. */
export class CreateCalendarFeeds1796138869429 implements MigrationInterface {
  name = 'CreateCalendarFeeds1796138869429';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`calendar_feed\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`user_id\` int NOT NULL,
        \`site_id\` int NOT NULL,
        \`token_hash\` char(64) NOT NULL,
        \`created_at\` datetime(3) NOT NULL,
        \`last_read_at\` datetime(3) NULL,
        UNIQUE INDEX \`calendar_feed_person\` (\`user_id\`, \`site_id\`),
        UNIQUE INDEX \`IDX_3a0b1d1c7619ea19ff1affaaf7\` (\`token_hash\`),
        PRIMARY KEY (\`id\`),
        CONSTRAINT \`FK_29b8f216ae4f5fdd5bcc8de8112\` FOREIGN KEY (\`user_id\`) REFERENCES \`user\` (\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION,
        CONSTRAINT \`FK_f68879d8458dd28fa62141dea34\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\` (\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
      ) ENGINE=InnoDB
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `calendar_feed`');
  }
}
