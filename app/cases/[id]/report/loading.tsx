import { ReportWaiting } from '@/components/report/report-waiting';

export default function Loading() {
  return <ReportWaiting />;
}
