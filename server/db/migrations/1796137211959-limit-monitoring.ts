import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Since when a finding is monitored, and until which day or for how many surveys. */
export class LimitMonitoring1796137211959 implements MigrationInterface {
  name = 'LimitMonitoring1796137211959';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE \`finding\`
        ADD COLUMN \`monitored_since\` datetime(3) NULL,
        ADD COLUMN \`monitor_until_on\` date NULL,
        ADD COLUMN \`monitor_surveys\` int NULL
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE \`finding\`
        DROP COLUMN \`monitor_surveys\`,
        DROP COLUMN \`monitor_until_on\`,
        DROP COLUMN \`monitored_since\`
    `);
  }
}
