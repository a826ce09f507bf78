/** The self-test for programs: a JSON document (every value only with `full`), or every value as a CSV record. */
import { type CheckedValue, passes } from '../../catalog/check-values.ts';
import { toleranceUsed, type VerifyReport } from '../../catalog/verify.ts';
import { csvTable } from './csv-table.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';
import type { VerifyHead } from './verify-text.ts';

export function verifyJson(
  report: VerifyReport,
  head: VerifyHead,
  full: boolean,
  document: DocumentHead,
  ascii: boolean,
): string {
  const { materials, fits, tested, passed, setAside, grades, failures } = report;
  const grade = ({ tested: count, worst }: (typeof grades)['A']) => ({
    tested: count,
    worst: worst ? record(worst) : null,
  });
  const body = {
    catalogueVersion: head.catalogueVersion,
    catalogueDate: head.catalogueDate,
    duration_s: head.seconds,
    materials,
    fits,
    tested,
    passed,
    failed: failures.length,
    setAside,
    grades: { A: grade(grades.A), B: grade(grades.B), C: grade(grades.C) },
    failures: failures.map(record),
    ...(full ? { values: report.values.map(record) } : {}),
  };
  return jsonDocument(document, body, ascii);
}

/** One value; what cannot be given is null, and `passed` is null where it is not judged. */
function record(value: CheckedValue) {
  const { key, axis, fit, grade, source, recalled, independent, quantity, published, computed } = value;
  return {
    key,
    axis,
    fit,
    grade,
    quantity,
    wavelength_um: value.wavelength_um ?? null,
    published,
    computed,
    difference: computed - published,
    tolerance: value.tolerance ?? null,
    toleranceUsed: value.tolerance === undefined ? null : toleranceUsed(value),
    passed: value.tolerance === undefined ? null : passes(value),
    setAside: value.setAside ?? null,
    source,
    recalled,
    independent,
  };
}

export function verifyCsv(report: VerifyReport, ascii: boolean): string {
  const records = report.values.map(record);
  const names = Object.keys(records[0] ?? {});
  return csvTable(
    names,
    records.map((r) => Object.values(r)),
    ascii,
  );
}
