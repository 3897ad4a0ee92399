import { readFile } from 'node:fs/promises';
import { Workspace } from '@/components/workspace';
import type { CaseFile } from '@/lib/casefile/schema';

export const dynamic = 'force-dynamic';

export default async function CasePage({ params }: { params: Promise<{ id: string }> }) {
  const { id } = await params;
  const casefile = JSON.parse(await readFile(`public/examples/${id}.case.json`, 'utf8')) as CaseFile;
  return <Workspace id={id} revision={1} casefile={casefile} />;
}
