/**
 * An order looked over before it leaves: one path at one or several waves, every remark with its level, its numbers and its
 * source. Nothing here is ever called safe.
 */
import type { Answer, Caution } from '../../answer/answer.ts';
import { answerQuestion } from '../../answer/answer-question.ts';
import type { Question, WaveSpec } from '../../answer/question.ts';
import type { FitWave } from '../../catalog/choose-fit.ts';
import type { Material } from '../../catalog/types.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import { materialFacts } from '../material-facts.ts';
import type { Survey } from '../survey.ts';
import { angleFinding, beamFinding } from './beam-findings.ts';
import { crystalFinding } from './crystal-findings.ts';
import { dataFinding } from './data-findings.ts';
import { type Finding, LEVELS, type Level } from './finding.ts';
import { fringeFinding, ghostFinding } from './ghost-findings.ts';
import { handlingFindings } from './handling-findings.ts';
import { coatingFindings, lossFinding } from './loss-findings.ts';
import { materialOf, type Subject, subjectsOf } from './subject.ts';
import { supplierQuestions } from './supplier-questions.ts';
import { temperatureFinding } from './temperature-findings.ts';
import { transmissionFinding, transmissionWithoutIndex } from './transmission-findings.ts';

export interface OrderAtWave {
  readonly spec: WaveSpec;
  /** Null where the data do not reach the wave. */
  readonly answer: Answer | null;
  readonly findings: readonly Finding[];
}

export interface OrderReport {
  readonly question: Question;
  readonly waves: readonly OrderAtWave[];
  /** What holds at every wave. */
  readonly general: readonly Finding[];
  readonly counts: Readonly<Record<Level, number>>;
  readonly askSupplier: readonly string[];
  /** Hazards of the beam, as every face words them. */
  readonly beamCautions: readonly Caution[];
}

/** Refusals that say that the data end before the wave; all others are the question's own. */
const NO_DATA: ReadonlySet<string> = new Set(['outside-fit-range', 'no-optical-constants', 'no-index-here']);

/** `questions`: the same path at each wave. */
export function orderReport(survey: Survey, questions: readonly Question[]): OrderReport | Refusal {
  const waves: OrderAtWave[] = [];
  const subjects: Subject[] = [];
  for (const question of questions) {
    const answer = answerQuestion(question, survey.sourceOf);
    if (isRefusal(answer)) {
      if (!NO_DATA.has(answer.code)) return answer;
      waves.push({ spec: question.wave, answer: null, findings: withoutData(question, answer) });
      continue;
    }
    const list = subjectsOf(question, answer);
    if (subjects.length === 0) subjects.push(...list);
    waves.push({ spec: question.wave, answer, findings: findingsAt(survey, question, answer, list) });
  }
  const [question] = questions as readonly [Question];
  const materials = [...new Set(orderedMaterials(question, subjects))];
  const [first] = waves;
  const general = [
    ...(first?.answer ? [beamFinding(first.answer, question.beam)] : []),
    ...materials.flatMap(handlingFindings),
  ];
  const all = [...waves.flatMap((w) => w.findings), ...general];
  const answers = waves.flatMap((w) => w.answer ?? []);
  return {
    question,
    waves,
    general,
    counts: countLevels(all),
    askSupplier: supplierQuestions(subjects, answers, all, question.beam),
    beamCautions: answers[0]?.cautions.filter((c) => c.about === 'beam' && c.level === 'hazard') ?? [],
  };
}

function countLevels(findings: readonly Finding[]): OrderReport['counts'] {
  const count = (level: Level): number => findings.filter((f) => f.level === level).length;
  return Object.fromEntries(LEVELS.map((level) => [level, count(level)])) as Record<Level, number>;
}

/** Of the subjects where an answer told them, else of every layer and the medium beyond. */
function orderedMaterials(question: Question, subjects: readonly Subject[]): readonly Material[] {
  if (subjects.length > 0) return subjects.flatMap((s) => s.material ?? []);
  return solids(question);
}

const solids = ({ layers, into }: Question): readonly Material[] =>
  [...layers.map((l) => l.medium), into]
    .flatMap((spec) => materialOf(spec) ?? [])
    .filter((m) => m.class !== 'gas' && m.key !== 'vacuum');

function findingsAt(
  survey: Survey,
  question: Question,
  answer: Answer,
  subjects: readonly Subject[],
): readonly Finding[] {
  const at: FitWave = {
    vacuum_um: answer.wave.vacuumWavelength_m * 1e6,
    air_um: answer.wave.airWavelength_m * 1e6,
  };
  const { beam } = question;
  const power_W = answer.energy?.incidentPower_W ?? null;
  const diameter_m = beam && 'profile' in beam ? (beam.diameter_m ?? null) : null;
  const films = answer.layers.filter((_, i) => !subjects.some((s) => s.layer?.number === i + 1));
  const [first] = subjects;
  return distinct([
    ...subjects.map((s) => dataFinding(s.medium, answer)),
    ...films.map((film) => dataFinding(film.medium, answer)),
    ...subjects.map((s) => transmissionFinding(s, answer.wave.vacuumWavelength_m, power_W)),
    lossFinding(subjects, answer, power_W),
    ...coatingFindings(survey, subjects, answer),
    ...present(first && angleFinding(first, answer)),
    ...subjects.flatMap((s) => present(crystalFinding(survey, s, at))),
    ...subjects.flatMap((s) => present(temperatureFinding(s, at, power_W))),
    ...present(ghostFinding(answer, power_W)),
    ...present(fringeFinding(subjects, answer, diameter_m)),
  ]);
}

/** Equal layers and faces give equal remarks: once is enough. */
const distinct = (findings: readonly Finding[]): readonly Finding[] =>
  findings.filter(
    (f, i) =>
      findings.findIndex((g) => g.topic === f.topic && g.about === f.about && g.text === f.text) === i,
  );

const present = (finding: Finding | null | undefined): readonly Finding[] => (finding ? [finding] : []);

/** Where the index is not known, the entry may still say whether the material transmits. */
function withoutData(question: Question, refusal: Refusal): readonly Finding[] {
  const { wave } = question;
  const data: Finding = {
    topic: 'data',
    level: 'stop',
    about: 'part',
    text: refusal.message,
    source: { kind: 'facts', text: 'ranges of the catalogue', doi: null },
  };
  const transmissions = solids(question).map((material) => {
    const { key, transparency_m, factsSource } = materialFacts(material);
    return transmissionWithoutIndex(key, transparency_m, wave.wavelength_m, factsSource);
  });
  return [data, ...transmissions];
}
