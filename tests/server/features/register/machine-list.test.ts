import { describe, expect, it } from 'vitest';
import { buildMachine, buildMember, buildSite } from '#tests/support/factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const dataSource = useTestDatabase();

/** Nine machines, three of each criticality, and the tags of a page of them. */
async function nine() {
  const site = await buildSite(dataSource());
  const lead = await buildMember(dataSource(), site, 'lead');
  const { as } = buildTestApp(dataSource());
  for (let i = 1; i <= 9; i += 1) {
    await buildMachine(dataSource(), site, {
      tag: `M-${i}`,
      name: i % 2 === 0 ? 'Even fan' : 'Odd pump',
      criticality: (['high', 'low', 'medium'] as const)[i % 3],
      kind: i > 6 ? 'fan' : 'pump',
      nextPlannedStopOn: i === 5 ? null : `2027-0${10 - i}-01`,
    });
  }
  return async (query: string) => {
    const { body } = await as(lead).get(`/api/sites/${site.id}/machines?${query}`);
    const tags: string[] = body.items.map((item: { tag: string }) => item.tag);
    return { tags: tags.join(' '), total: body.total };
  };
}

describe('the order of the machine list', () => {
  it.each([
    ['sort=criticality', 'M-1 M-4 M-7 M-2 M-5 M-8 M-3 M-6 M-9', 9],
    ['sort=criticality&direction=desc', 'M-9 M-6 M-3 M-8 M-5 M-2 M-7 M-4 M-1', 9],
    ['sort=criticality&pageSize=4', 'M-1 M-4 M-7 M-2', 9],
    ['sort=criticality&pageSize=4&page=2', 'M-5 M-8 M-3 M-6', 9],
    ['sort=criticality&pageSize=4&page=3', 'M-9', 9],
    ['sort=criticality&pageSize=4&page=4', '', 9],
    ['sort=criticality&kind=fan', 'M-7 M-8 M-9', 3],
    ['sort=criticality&criticality=high', 'M-3 M-6 M-9', 3],
    ['sort=nextPlannedStopOn&pageSize=3', 'M-5 M-9 M-8', 9],
    ['sort=name&pageSize=5', 'M-2 M-4 M-6 M-8 M-1', 9],
    ['sort=name&direction=desc&pageSize=2', 'M-9 M-7', 9],
    ['sort=kind&pageSize=4', 'M-7 M-8 M-9 M-1', 9],
    ['search=odd&sort=tag&direction=desc', 'M-9 M-7 M-5 M-3 M-1', 5],
    ['search=odd&pageSize=2&page=3', 'M-9', 5],
    ['pageSize=9', 'M-1 M-2 M-3 M-4 M-5 M-6 M-7 M-8 M-9', 9],
    ['pageSize=3&page=3', 'M-7 M-8 M-9', 9],
    ['pageSize=3&page=7', '', 9],
    ['search=nothing', '', 0],
  ])('for %s is right, with the number of all', async (query, tags, total) => {
    const list = await nine();
    expect(await list(query)).toEqual({ tags, total });
  });
});
