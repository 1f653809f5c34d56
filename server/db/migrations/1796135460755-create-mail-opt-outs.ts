import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateMailOptOuts1796135460755 implements MigrationInterface {
  name = 'CreateMailOptOuts1796135460755';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`mail_opt_out\` (
        \`user_id\` int NOT NULL,
        \`kind\` varchar(12) NOT NULL,
        \`opted_out_at\` datetime(3) NOT NULL,
        PRIMARY KEY (\`user_id\`, \`kind\`),
        CONSTRAINT \`FK_be4c62a1a79b954b04c5a9898e8\` FOREIGN KEY (\`user_id\`) REFERENCES \`user\` (\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
      ) ENGINE=InnoDB
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `mail_opt_out`');
  }
}
