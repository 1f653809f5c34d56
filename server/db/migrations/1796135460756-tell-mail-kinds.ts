import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Whose mail it is, of which kind, for which site; unknown of mails written before. */
export class TellMailKinds1796135460756 implements MigrationInterface {
  name = 'TellMailKinds1796135460756';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE \`outbox_mail\`
        ADD COLUMN \`kind\` varchar(12) NULL,
        ADD COLUMN \`to_user_id\` int NULL,
        ADD COLUMN \`site_id\` int NULL,
        ADD INDEX \`outbox_mail_site\` (\`site_id\`, \`state\`)
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE \`outbox_mail\`
        DROP INDEX \`outbox_mail_site\`,
        DROP COLUMN \`site_id\`,
        DROP COLUMN \`to_user_id\`,
        DROP COLUMN \`kind\`
    `);
  }
}
