import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateMail1796083204000 implements MigrationInterface {
  name = 'CreateMail1796083204000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`outbox_mail\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`occasion\` varchar(120) NOT NULL,
        \`to_address\` varchar(254) NOT NULL,
        \`subject\` varchar(200) NOT NULL,
        \`text_body\` text NOT NULL,
        \`html_body\` text NOT NULL,
        \`state\` varchar(8) NOT NULL,
        \`attempts\` int NOT NULL DEFAULT '0',
        \`next_attempt_at\` datetime(3) NOT NULL,
        \`last_error\` text NULL,
        \`created_at\` datetime(3) NOT NULL,
        \`sent_at\` datetime(3) NULL,
        INDEX \`outbox_mail_due\` (\`state\`, \`next_attempt_at\`),
        UNIQUE INDEX \`IDX_156708e24d634e61d571f03928\` (\`occasion\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`demo_mail\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`to_address\` varchar(254) NOT NULL,
        \`from_address\` varchar(254) NOT NULL,
        \`subject\` varchar(255) NOT NULL,
        \`text_body\` mediumtext NOT NULL,
        \`html_body\` mediumtext NOT NULL,
        \`received_at\` datetime(3) NOT NULL,
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `demo_mail`');
    await runner.query('DROP TABLE `outbox_mail`');
  }
}
