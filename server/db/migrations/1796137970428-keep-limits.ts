import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The limits of the verdict that a site has set, for itself or for a kind of its machines. */
export class KeepLimits1796137970428 implements MigrationInterface {
  name = 'KeepLimits1796137970428';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`limits_change\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`site_id\` int NOT NULL,
        \`machine_kind\` varchar(32) NULL,
        \`suspected_score\` double NULL,
        \`likely_score\` double NULL,
        \`reason\` text NOT NULL,
        \`changed_by_user_id\` int NOT NULL,
        \`changed_at\` datetime(3) NOT NULL,
        INDEX \`limits_change_site\` (\`site_id\`, \`machine_kind\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      ALTER TABLE \`limits_change\` ADD CONSTRAINT \`FK_e9c48eb5593488522e0fb4db0b9\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`limits_change\` ADD CONSTRAINT \`FK_4411f51150b351861e8bf32ce92\` FOREIGN KEY (\`changed_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `limits_change`');
  }
}
