import type { Header, Report, Section } from '@/lib/report/report';
import { BlockView } from './block-view';
import { PageEdges } from './page-edges';
import { ReportToolbar } from './report-toolbar';
import styles from './report.module.css';

/** The report as sheets of paper on the screen, and as pages in print. */
export function ReportView({ report, id }: { report: Report; id: string }) {
  const { header, sections } = report;
  const sheets = sheetsOf(sections);
  return (
    <div className={styles.desk}>
      <ReportToolbar id={id} paper={header.paper} />
      <PageEdges edges={header.edges} />
      <main className={styles.report} data-report data-paper={header.paper}>
        {sheets.map((sheet, k) => (
          <div key={sheet[0].id} className={styles.sheet} data-own-page={sheet[0].ownPage || undefined}>
            {k === 0 && <TitleBlock header={header} />}
            {sheet.map((section) => (
              <SectionView key={section.id} section={section} number={sections.indexOf(section) + 1} />
            ))}
            {k === sheets.length - 1 && <p className={styles.end}>End of report</p>}
          </div>
        ))}
      </main>
    </div>
  );
}

/** On the screen the first section, one with a page of its own, and each long stretch are sheets apart. */
function sheetsOf(sections: Section[]): Section[][] {
  const sheets: Section[][] = [];
  for (const section of sections) {
    const previous = sheets.at(-1)?.at(-1);
    if (!previous || section.ownPage || previous.ownPage) sheets.push([section]);
    else sheets.at(-1)?.push(section);
  }
  return sheets;
}

function TitleBlock({ header }: { header: Header }) {
  return (
    <header className={styles.titleBlock}>
      <div className={styles.titleRow}>
        <h1>{header.title}</h1>
        {header.reference !== '' && <p className={styles.reference}>{header.reference}</p>}
      </div>
      <p className={styles.subject}>{header.subject}</p>
      <dl className={styles.titleRows}>
        {header.rows.map(([term, text]) => (
          <div key={term}>
            <dt>{term}</dt>
            <dd>{text}</dd>
          </div>
        ))}
      </dl>
    </header>
  );
}

function SectionView({ section, number }: { section: Section; number: number }) {
  return (
    <section className={styles.section} aria-labelledby={`section-${section.id}`} data-section={section.id}>
      <h2 id={`section-${section.id}`}>
        <span className={styles.number}>{number}</span> {section.title}
      </h2>
      {section.blocks.map((block, k) => (
        <BlockView key={k} block={block} />
      ))}
    </section>
  );
}
