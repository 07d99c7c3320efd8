import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Finding, Problem } from "../../../../sandbox/engine/model.ts";
import { Button } from "../../../components/button.tsx";
import { Icon, type IconName } from "../../../components/icon.tsx";
import { findSongPlace } from "../ribbon/song-place.ts";
import { listFindings, splitFindings, type RunState } from "./run-model.ts";
import { Sentence } from "../../../components/sentence.tsx";

export interface CheckPaneProps {
  song: BeatMap;
  run: RunState;
  /** Goes to a finding's moment and line. */
  onShow: (finding: Finding) => void;
  onShowProblem: (problem: Problem) => void;
}

const KINDS: { readonly [S in Finding["severity"]]: { readonly word: string; readonly icon: IconName } } = {
  stop: { word: "Stop", icon: "stop" },
  warn: { word: "Look", icon: "warn" },
  note: { word: "Note", icon: "info" },
};

/** What is wrong or worth a look: the problem that stopped the script, then findings, the grave ones first. */
export function CheckPane({ song, run, onShow, onShowProblem }: CheckPaneProps) {
  const { own, setUp } = splitFindings(listFindings(run));
  const problem = run.outcome?.ok === false ? run.outcome.problem : null;
  const isChecking = run.outcome?.ok === true && run.checked === null;
  return (
    <>
      {run.failure && <p className="studio-empty">{run.failure}</p>}
      <ul className="studio-findings">
        {problem && <ProblemRow problem={problem} onShow={() => onShowProblem(problem)} />}
        {own.map((finding) => (
          <FindingRow key={`${finding.rule}-${finding.sentence}`} song={song} finding={finding} onShow={onShow} />
        ))}
      </ul>
      {!problem && own.length === 0 && <p className="studio-empty">{presentEmpty(run, isChecking)}</p>}
      {own.length > 0 && isChecking && <p className="studio-empty">The flash check is still running.</p>}
      {setUp.length > 0 && (
        <details className="studio-setup">
          <summary>For whoever sets up the square: {setUp.length === 1 ? "1 note" : `${setUp.length} notes`}</summary>
          <ul className="studio-findings">
            {setUp.map((finding) => (
              <FindingRow key={`${finding.rule}-${finding.sentence}`} song={song} finding={finding} onShow={onShow} />
            ))}
          </ul>
        </details>
      )}
      <p className="studio-aid">
        A planning aid: flashing light can harm people. The safety officer decides. Handing in is always possible.
      </p>
    </>
  );
}

interface FindingRowProps {
  song: BeatMap;
  finding: Finding;
  onShow: (finding: Finding) => void;
}

function FindingRow({ song, finding, onShow }: FindingRowProps) {
  return (
    <li data-kind={finding.severity}>
      <Kind severity={finding.severity} />
      <div>
        <p>
          <Sentence text={finding.sentence} /> {finding.hint && <Sentence text={finding.hint} />}
        </p>
        <p className="studio-meta">{presentPlaces(song, finding)}</p>
      </div>
      {(finding.moments.length > 0 || finding.lines.length > 0) && (
        <Button size="small" onPress={() => onShow(finding)}>
          Show me
        </Button>
      )}
    </li>
  );
}

function Kind({ severity }: { severity: Finding["severity"] }) {
  return (
    <span className="studio-kind">
      <Icon name={KINDS[severity].icon} />
      {KINDS[severity].word}
    </span>
  );
}

function ProblemRow({ problem, onShow }: { problem: Problem; onShow: () => void }) {
  return (
    <li data-kind="stop">
      <span className="studio-kind">
        <Icon name="stop" />
        Problem
      </span>
      <div>
        <p>
          <Sentence text={problem.sentence} />
        </p>
        <p className="studio-meta">
          line {problem.range.line} · try: <Sentence text={problem.hint} />
        </p>
        {problem.details && (
          <details className="studio-meta">
            <summary>details</summary>
            {problem.details}
          </details>
        )}
      </div>
      <Button size="small" onPress={onShow}>
        Show me
      </Button>
    </li>
  );
}

function presentPlaces(song: BeatMap, { lines, moments, lights }: Finding): string {
  const [moment] = moments;
  const pieces: string[] = [];
  if (lines.length > 0)
    pieces.push(
      lines.length === 1
        ? `line ${lines[0]}`
        : `lines ${lines.slice(0, 4).join(", ")}${lines.length > 4 ? " ..." : ""}`,
    );
  if (moment !== undefined) {
    const { bar, beat } = findSongPlace(song, moment);
    pieces.push(`bar ${bar}, beat ${beat}${moments.length > 1 ? ` and ${moments.length - 1} more` : ""}`);
  }
  if (lights.length > 0)
    pieces.push(lights.length === 1 ? "1 light" : `${lights.length}${lights.length === 50 ? " or more" : ""} lights`);
  return pieces.join(" · ");
}

function presentEmpty(run: RunState, isChecking: boolean): string {
  if (run.isRunning && !run.outcome) return "Running the script.";
  if (!run.outcome) return "Run the script to see what the check says.";
  return isChecking ? "The script runs. The flash check comes next." : "The script runs, and the check found nothing.";
}
