import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { Workspace } from '@/components/workspace';
import { keptCase } from '@/lib/entry/kept-cases';

export const dynamic = 'force-dynamic';

interface Props {
  params: Promise<{ id: string }>;
}

const found = cache(keptCase);

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const kept = await found((await params).id);
  return { title: kept ? kept.case.title : 'No such case' };
}

export default async function CasePage({ params }: Props) {
  const kept = await found((await params).id);
  if (!kept) notFound();
  return <Workspace id={kept.id} revision={kept.revision} casefile={kept.case} />;
}
