import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import '@fontsource/inter/400.css';
import '@fontsource/inter/400-italic.css';
import '@fontsource/inter/600.css';
import '@fontsource/inter/600-italic.css';
import '@fontsource/inter/700-italic.css';
import { ReportRefused } from '@/components/report/report-refused';
import { ReportView } from '@/components/report/report-view';
import { labelOf } from '@/lib/casefile/fields';
import { keptCase } from '@/lib/entry/kept-cases';
import { reportOn } from '@/lib/entry/report-on';
import './print.css';

export const dynamic = 'force-dynamic';

interface Props {
  params: Promise<{ id: string }>;
  searchParams: Promise<{ paper?: string | string[] }>;
}

const found = cache(keptCase);

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const kept = await found((await params).id);
  return { title: kept ? `${kept.case.title}, report` : 'No such case' };
}

/** The report on the newest saved revision; `?paper=Letter` or `A4` overrides the paper of the case. */
export default async function ReportPage({ params, searchParams }: Props) {
  const kept = await found((await params).id);
  if (!kept) notFound();
  const outcome = await reportOn(kept, (await searchParams).paper);
  if (outcome.kind === 'written') return <ReportView id={kept.id} report={outcome.report} />;
  const labels = outcome.issues.map(({ path }) => labelOf(kept.case, path));
  return <ReportRefused id={kept.id} title={kept.case.title} issues={outcome.issues} labels={labels} />;
}
