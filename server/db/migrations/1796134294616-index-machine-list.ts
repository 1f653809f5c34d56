import type { MigrationInterface, QueryRunner } from 'typeorm';

const indexes: Readonly<Record<string, string>> = {
  machine_site_tag_name: '`site_id`, `tag`, `name`',
  machine_site_name: '`site_id`, `name`, `tag`, `kind`, `criticality`',
  machine_site_stop: '`site_id`, `next_planned_stop_on`, `tag`, `name`, `kind`, `criticality`',
  machine_site_kind: '`site_id`, `kind`, `tag`, `name`, `criticality`',
  machine_site_criticality: '`site_id`, `criticality`, `tag`, `name`, `kind`',
};

/** The machine list reads each of its sorts in the order of an index. */
export class IndexMachineList1796134294616 implements MigrationInterface {
  name = 'IndexMachineList1796134294616';

  async up(runner: QueryRunner): Promise<void> {
    for (const [name, columns] of Object.entries(indexes)) {
      await runner.query(`CREATE INDEX \`${name}\` ON \`machine\` (${columns})`);
    }
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const name of Object.keys(indexes)) {
      await runner.query(`DROP INDEX \`${name}\` ON \`machine\``);
    }
  }
}
