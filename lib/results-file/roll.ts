import { CodeIndex, fold } from './code-index';
import { listNames } from './header';
import type { PlanLaboratory, ResultsPlan } from './plan';
import type { Findings } from './problem';
import { quoteFound } from './quote-found';
import type { FileKind } from './result-types';

/** Whose row it is. A laboratory's own file has one nameless laboratory. */
export type RollEntry = { at: number; id: number | null; name: string | null };

const NAMES_SHOWN = 8;

/** Keeps the roll of who reported what: finds laboratories and repeated rows, and tells what is missing. */
export class Roll {
  readonly newLaboratories: string[] = [];
  private readonly known = new CodeIndex<PlanLaboratory>();
  private readonly byText = new Map<string, RollEntry>();
  private readonly byKey = new Map<string, RollEntry>();
  private readonly lines = new Map<number, number>();
  private readonly counts: number[];
  private readonly mostReplicates: number;

  constructor(
    private readonly plan: ResultsPlan,
    private readonly kind: FileKind,
  ) {
    this.counts = plan.measurands.map(() => 0);
    this.mostReplicates = plan.measurands.reduce((most, { replicates }) => Math.max(most, replicates), 1);
    if (kind === 'laboratory') this.byText.set('', this.enter('own', { id: null, name: null }));
    for (const laboratory of plan.laboratories ?? []) {
      this.known.add(laboratory.name, laboratory);
      if (laboratory.code !== undefined) this.known.add(laboratory.code, laboratory);
    }
  }

  /** The laboratory of a row by the text of its cell; one that the plan does not have is entered as new. */
  entryOf(text: string): RollEntry {
    const same = this.byText.get(text);
    if (same !== undefined) return same;
    const laboratory = this.known.find(text);
    const key = laboratory === undefined ? `new ${fold(text)}` : `id ${laboratory.id}`;
    const present = this.byKey.get(key);
    if (present === undefined && laboratory === undefined) this.newLaboratories.push(text);
    const entry = present ?? this.enter(key, { id: laboratory?.id ?? null, name: laboratory?.name ?? text });
    this.byText.set(text, entry);
    return entry;
  }

  private enter(key: string, who: Omit<RollEntry, 'at'>): RollEntry {
    const entry = { at: this.byKey.size, ...who };
    this.byKey.set(key, entry);
    return entry;
  }

  /** @returns the line that has the same laboratory, measurand and replicate already, or null. */
  mark(entry: RollEntry, measurandAt: number, replicate: number, line: number): number | null {
    const key =
      (entry.at * this.plan.measurands.length + measurandAt) * (this.mostReplicates + 1) + replicate;
    const earlier = this.lines.get(key);
    if (earlier !== undefined) return earlier;
    this.lines.set(key, line);
    this.counts[measurandAt] = (this.counts[measurandAt] ?? 0) + 1;
    return null;
  }

  /** Tells what the plan asks for and the file does not have, and which laboratories are new. */
  notice(findings: Findings): void {
    const present = this.byKey.size;
    this.plan.measurands.forEach(({ item, measurand, replicates }, at) => {
      const count = this.counts[at] ?? 0;
      const wanted = replicates * present;
      if (count >= wanted) return;
      const of =
        this.kind === 'whole-round' ? ` of ${present} ${present === 1 ? 'laboratory' : 'laboratories'}` : '';
      const words =
        wanted === 1
          ? `${item}, ${measurand}: the file has no result, and the plan asks for one.`
          : `${item}, ${measurand}: the file has ${count === 0 ? 'none' : count} of the ${wanted} results that the plan asks for${of}.`;
      findings.notice('not-reported', null, null, words);
    });
    const { newLaboratories } = this;
    if (newLaboratories.length === 0) return;
    const names = newLaboratories.slice(0, NAMES_SHOWN).map(quoteFound);
    const rest = newLaboratories.length - names.length;
    const shown = rest > 0 ? `${names.join(', ')} and ${rest} more` : listNames(names);
    const are =
      newLaboratories.length === 1 ? 'One laboratory is' : `${newLaboratories.length} laboratories are`;
    findings.notice('new-laboratory', null, 'laboratory', `${are} not known yet and will be new: ${shown}.`);
  }
}
