import type { Saving } from '@/components/hooks/use-autosave';
import type { CaseFiles } from '@/components/hooks/use-case-files';
import { useTakeOn } from '@/components/hooks/use-commands';
import { useSessionStore } from '@/components/hooks/use-session';
import { saveFile } from './save-file';

/** What the title bar offers, by command. */
export function useTitleCommands(id: string, saving: Saving, files: CaseFiles): void {
  const session = useSessionStore();
  const leave = async (to: string): Promise<void> => {
    await saving.flush();
    location.assign(to);
  };
  useTakeOn({
    'file.new': () => void files.create(),
    'file.duplicate': () => void files.duplicate(session.getState().casefile),
    'file.save': () => saveFile(session.getState().casefile),
    'file.open': () => pickFile((file) => void files.openFile(file)),
    'case.report': () => void leave(`/cases/${id}/report`),
    'case.list': () => void leave('/'),
  });
}

/** Asks for a case file as the browser does. */
function pickFile(onFile: (file: File) => void): void {
  const input = document.createElement('input');
  input.type = 'file';
  input.accept = '.json,application/json';
  input.addEventListener('change', () => {
    if (input.files?.[0]) onFile(input.files[0]);
  });
  input.click();
}
