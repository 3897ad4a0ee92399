import buttons from '@/components/ui/button.module.css';
import type { Saving } from '@/components/hooks/use-autosave';
import type { SaveState } from '@/lib/session/autosave';
import styles from './title-bar.module.css';

const clock = new Intl.DateTimeFormat(undefined, { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' });

/** How the open case stands on the server, in a few words. */
export function SaveStatus({ save }: { save: SaveState }) {
  return (
    <span className={styles.status} data-state={save.kind} role="status">
      {inWords(save)}
    </span>
  );
}

function inWords(save: SaveState): string {
  switch (save.kind) {
    case 'saved':
      return save.at === null ? 'saved' : `saved ${clock.format(save.at)}`;
    case 'saving':
      return 'saving…';
    case 'offline':
      return 'offline, kept in this browser';
    case 'conflict':
      return 'changed in another tab';
    case 'deleted':
      return 'deleted elsewhere';
    case 'refused':
      return 'not saved';
  }
}

/** What the user has to decide before saving goes on. Both versions are safe until then. */
export function SaveChoice({ saving }: { saving: Saving }) {
  const { save } = saving;
  if (save.kind !== 'conflict' && save.kind !== 'deleted') return null;
  return (
    <div className={styles.choice} role="alert">
      <span>
        {save.kind === 'conflict'
          ? `Another tab saved revision ${save.revision} of this case. What you see here is kept in this browser, not yet on the server.`
          : 'This case was deleted elsewhere. What you see here is kept in this browser.'}
      </span>
      {save.kind === 'conflict' ? (
        <button type="button" className={buttons.button} onClick={() => void saving.takeTheirs()}>
          Take the other version
        </button>
      ) : (
        <button type="button" className={buttons.button} onClick={() => void saving.restore()}>
          Restore the case
        </button>
      )}
      <button type="button" className={buttons.button} onClick={() => void saving.keepMine()}>
        Keep mine as a new case
      </button>
    </div>
  );
}
