/** How bad a problem in an import is: the file is refused, a part is left out, or something is only remarked. */
export const PROBLEM_SEVERITIES = ['refused', 'left-out', 'note'] as const;
export type ProblemSeverity = (typeof PROBLEM_SEVERITIES)[number];

/** One problem of an import; `line` is the line in the file, its header being line 1. */
export interface ImportProblem {
  severity: ProblemSeverity;
  file: string | null;
  line: number | null;
  /** Dotted `thing.what`, stable, for filters and tests. */
  code: string;
  /** What is wrong and what was done, for a person. */
  message: string;
}

/** Where problems are collected while a timetable is read. */
export interface ProblemLog {
  add(problem: ImportProblem): void;
  /** Whether anything in the file forbids taking it. */
  refuses(): boolean;
  /** Everything collected, refusals first, then what was left out, then notes. */
  list(): ImportProblem[];
}

/**
 * Problems kept of one kind in one file. A file with one mistake in every row has said enough after so many (our
 * choice); the rest is counted in one last line.
 */
export const problemsKeptOfOneKind = 200;

interface Kind {
  kept: ImportProblem[];
  dropped: number;
}

function inWords({ kept, dropped }: Kind): ImportProblem[] {
  const [first] = kept;
  if (first === undefined || dropped === 0) return kept;
  const message = `${dropped} more of the same kind in this file.`;
  return [...kept, { ...first, line: null, message }];
}

/** An empty log. */
export function createProblemLog(): ProblemLog {
  const kinds = new Map<string, Kind>();
  let refused = false;
  return {
    add(problem) {
      refused ||= problem.severity === 'refused';
      const key = `${problem.severity} ${problem.file ?? ''} ${problem.code}`;
      const kind = kinds.get(key) ?? { kept: [], dropped: 0 };
      kinds.set(key, kind);
      if (kind.kept.length < problemsKeptOfOneKind) kind.kept.push(problem);
      else kind.dropped += 1;
    },
    refuses: () => refused,
    list() {
      const all = [...kinds.values()].flatMap(inWords);
      return PROBLEM_SEVERITIES.flatMap((severity) => all.filter((problem) => problem.severity === severity));
    },
  };
}
