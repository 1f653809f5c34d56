import { Button } from '#src/components/button.tsx';
import { CautionPanel } from '#src/components/caution-panel.tsx';
import { DescriptionList } from '#src/components/description-list.tsx';
import { ErrorState } from '#src/components/error-state.tsx';
import { KeyHint } from '#src/components/key-hint.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Panel } from '#src/components/panel.tsx';
import { ProgressBar } from '#src/components/progress-bar.tsx';
import { Skeleton } from '#src/components/skeleton.tsx';
import { Timeline } from '#src/components/timeline.tsx';
import { useToast } from '#src/components/toast.tsx';

export function StatesSection() {
  const notify = useToast();
  return (
    <div className="grid gap-4 phone:grid-cols-2">
      <CautionPanel
        cautions={[
          'Isolate, lock out and prove dead before opening.',
          'Springs, pressure and raised loads hold energy: release it first.',
          'Heated bearings need gloves and clear hands. Never an open flame.',
        ]}
      />
      <ErrorState
        title="The server can’t be reached."
        safe="What was saved before is safe."
        advice="Check the connection, then try again."
        errorId="01HV9K7Q"
        action={<Button icon="retry">Try again</Button>}
      />
      <Panel title="History">
        <Timeline
          label="History of the finding"
          entries={[
            {
              id: 1,
              at: { iso: '2026-03-04', text: '4 Mar 2026, 14:05' },
              title: 'Opened by Ines Okafor',
              children: 'Run of nine harmonics at the drive end.',
            },
            {
              id: 2,
              at: { iso: '2026-03-06', text: '6 Mar 2026, 09:12' },
              title: 'Inspection assigned to Tomas Lind',
            },
          ]}
        />
      </Panel>
      <Panel title="Loading">
        <Skeleton lines={4} />
      </Panel>
      <Panel title="Progress">
        <ProgressBar label="Upload" value={37} max={60} text="37 of 60" />
        <div className="mt-3 flex items-center gap-2 text-sm">
          Next flag <KeyHint keys={['J']} /> accept <KeyHint keys={['Shift', 'A']} />
        </div>
        <div className="mt-3 flex gap-2">
          <Button
            onClick={() =>
              notify({
                text: 'Flag accepted, finding 41 extended.',
                action: { label: 'Undo', onAction: () => undefined },
              })
            }
          >
            Tell
          </Button>
          <Button
            onClick={() =>
              notify({ text: 'The flag was decided by someone else meanwhile.', failed: true })
            }
          >
            Tell a failure
          </Button>
        </div>
      </Panel>
      <Panel title="Facts">
        <DescriptionList
          items={[
            { label: 'Bearing', value: '6312, CN' },
            { label: 'Shaft class', value: 'k5' },
            { label: 'Load', value: null },
          ]}
        />
        <div className="mt-3">
          <Notice title="Speed told, not refined">The record is too short to refine it.</Notice>
        </div>
        <div className="mt-3">
          <Notice loud title="2 files were left out">
            Only .csv is read.
          </Notice>
        </div>
      </Panel>
    </div>
  );
}
