import type { DataSource } from 'typeorm';
import type {
  ImportRow,
  RegisterImportResponse,
  RegisterKind,
  RowFate,
} from '#shared/contracts/register-import.ts';
import { buildMember, buildSite } from '#tests/support/factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';

/** A site with its people, and what a lead does with files there. */
export async function importStory(dataSource: DataSource) {
  const site = await buildSite(dataSource);
  const lead = await buildMember(dataSource, site, 'lead');
  const owner = await buildMember(dataSource, site, 'owner');
  const { as } = buildTestApp(dataSource);
  const path = `/api/sites/${site.id}`;
  const imports = `${path}/register/imports`;

  const send = (kind: string, file: string | Buffer, fileName = 'register.csv') =>
    as(lead)
      .post(imports)
      .field('kind', kind)
      .attach('file', typeof file === 'string' ? Buffer.from(file) : file, fileName);

  const one = async (importId: number): Promise<RegisterImportResponse> =>
    (await as(lead).get(`${imports}/${importId}`)).body;

  /** Sends a file and waits until every row has its fate. */
  const dryRun = async (kind: RegisterKind, file: string | Buffer) => {
    const sent = await send(kind, file);
    if (sent.status !== 201) throw new Error(`Refused: ${JSON.stringify(sent.body)}`);
    for (;;) {
      const now = await one(sent.body.id);
      if (now.state !== 'reading') return now;
      await new Promise((resolve) => setTimeout(resolve, 10));
    }
  };

  const rows = async (importId: number, fate?: RowFate): Promise<ImportRow[]> =>
    (
      await as(lead).get(
        `${imports}/${importId}/rows?pageSize=200${fate === undefined ? '' : `&fate=${fate}`}`,
      )
    ).body.items;

  return {
    site,
    lead,
    owner,
    as,
    path,
    imports,
    send,
    one,
    dryRun,
    rows,
    apply: (importId: number) => as(lead).post(`${imports}/${importId}/apply`),
    undo: (importId: number) => as(lead).post(`${imports}/${importId}/undo`),
    /** Sends a file whose rows are all right, and writes it. */
    load: async (kind: RegisterKind, file: string) => {
      const { id, counts } = await dryRun(kind, file);
      if (counts.wrong > 0) throw new Error(JSON.stringify(await rows(id, 'wrong')));
      const applied = await as(lead).post(`${imports}/${id}/apply`);
      if (applied.status !== 200) throw new Error(JSON.stringify(applied.body));
      return id;
    },
    exported: async (kind: RegisterKind): Promise<string> =>
      (await as(lead).get(`${path}/register/exports/${kind}`)).text,
    machines: async () => (await as(lead).get(`${path}/machines?pageSize=200`)).body.items,
  };
}
