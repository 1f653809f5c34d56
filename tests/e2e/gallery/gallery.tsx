/** Every component in one place, to be looked at: `npx vite`, then /tests/e2e/gallery/. Not shipped. */
import { createRoot } from 'react-dom/client';
import { MemoryRouter } from 'react-router-dom';
import { Providers } from '#src/app/providers.tsx';
import { Shell } from '#src/app/shell.tsx';
import { startTheme } from '#src/app/theme.ts';
import { IconButton } from '#src/components/icon-button.tsx';
import { Menu } from '#src/components/menu.tsx';
import { createQueryClient } from '#src/lib/query-client.ts';
import '#src/styles.css';
import { FormsSection } from './forms-section.tsx';
import { ListsSection } from './lists-section.tsx';
import { MarksSection } from './marks-section.tsx';
import { PlotsSection } from './plots-section.tsx';
import { StatesSection } from './states-section.tsx';

startTheme();
const root = document.getElementById('root');
if (root === null) throw new Error('no #root');
const only = new URLSearchParams(location.search).get('section');

const sections = {
  marks: <MarksSection />,
  plots: <PlotsSection />,
  lists: <ListsSection />,
  forms: <FormsSection />,
  states: <StatesSection />,
};

createRoot(root).render(
  <Providers queryClient={createQueryClient()}>
    <MemoryRouter initialEntries={['/machines']}>
      <Shell
        homeTo="/"
        site="Brackwater Paper Works"
        navigation={[
          { to: '/review', label: 'Review', waiting: 12 },
          { to: '/surveys', label: 'Surveys' },
          { to: '/findings', label: 'Findings', waiting: 3 },
          { to: '/inspections', label: 'Inspections' },
          { to: '/machines', label: 'Machines' },
          { to: '/routes', label: 'Routes' },
        ]}
        account={
          <Menu
            align="end"
            heading="Ines Okafor, analyst"
            trigger={<IconButton icon="more" label="Account" />}
            items={[{ label: 'Sign out', onSelect: () => undefined }]}
          />
        }
      >
        <div className="flex flex-col gap-6">
          {Object.entries(sections)
            .filter(([name]) => only === null || only === name)
            .map(([name, section]) => (
              <div key={name}>{section}</div>
            ))}
        </div>
      </Shell>
    </MemoryRouter>
  </Providers>,
);
