import { labelOf } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Travels } from '@/lib/geometry/timed-path';
import type { Shapes } from '@/lib/results/bands';
import type { Result } from '@/lib/results/result';
import { cautionsSection } from './cautions-section';
import { checksSection } from './checks-section';
import { authorSection, reproduceSection } from './closing-sections';
import { domainSection } from './domain-section';
import { failuresOf } from './failures';
import { fitSection } from './fit-section';
import { type Issue, headerOf } from './header';
import { inputsSection } from './inputs-section';
import { assumptionsSection, methodSection } from './method-section';
import { planSection } from './plan-section';
import type { Report, Section } from './report';
import { headlineSection } from './headline-section';
import { resultsSection } from './results-section';
import { sensitivitySection } from './sensitivity-section';
import { travelSection } from './travel-section';
import { workedSection } from './worked-section';

/**
 * The report on a solved case, as plain data in reading order. `shapes` are for the picture of the speeds only; `issue`
 * says which revision it reports on and on what paper; `simulated` is the travel that goes with the result. The same arguments give the same report.
 */
export function writeReport(
  casefile: CaseFile,
  result: Result,
  shapes: Shapes,
  issue: Issue = {},
  simulated: Travels = {},
): Report {
  const travels = failuresOf(result).length > 0 ? {} : simulated;
  const header = headerOf(casefile, result, issue);
  const sections: (Section | null)[] = [
    headlineSection(casefile, result, shapes),
    planSection(casefile, result, header.paper, travels),
    travelSection(casefile, travels),
    inputsSection(casefile, result),
    methodSection(result),
    assumptionsSection(casefile),
    workedSection(casefile, result),
    resultsSection(casefile, result),
    fitSection(casefile, result),
    sensitivitySection(result, (path) => labelOf(casefile, path)),
    checksSection(result),
    domainSection(casefile, result),
    cautionsSection(casefile),
    reproduceSection(casefile, result),
    authorSection(),
  ];
  return { header, sections: sections.filter((section) => section !== null) };
}
