import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Where a site’s maintenance system is told of inspections, and what it is told. */
export class CreateWebhooks1796138869430 implements MigrationInterface {
  name = 'CreateWebhooks1796138869430';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`webhook\` (
        \`site_id\` int NOT NULL,
        \`url\` varchar(500) NOT NULL,
        \`secret\` varchar(200) NOT NULL,
        \`since\` datetime(3) NOT NULL,
        PRIMARY KEY (\`site_id\`),
        CONSTRAINT \`FK_07efb8200320d59507d6d86e222\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\` (\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`webhook_delivery\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`site_id\` int NOT NULL,
        \`state_change_id\` int NOT NULL,
        \`inspection_id\` int NOT NULL,
        \`body\` text NOT NULL,
        \`state\` varchar(8) NOT NULL,
        \`attempts\` int NOT NULL DEFAULT '0',
        \`next_attempt_at\` datetime(3) NOT NULL,
        \`last_error\` text NULL,
        \`created_at\` datetime(3) NOT NULL,
        \`sent_at\` datetime(3) NULL,
        INDEX \`webhook_delivery_due\` (\`state\`, \`next_attempt_at\`),
        UNIQUE INDEX \`webhook_delivery_change\` (\`state_change_id\`),
        PRIMARY KEY (\`id\`),
        CONSTRAINT \`FK_1611c3a7603dfcd13ec75cb488b\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\` (\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
      ) ENGINE=InnoDB
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `webhook_delivery`');
    await runner.query('DROP TABLE `webhook`');
  }
}
