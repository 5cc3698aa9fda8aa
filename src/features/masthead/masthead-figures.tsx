import { ABSOLUTE_ZERO } from '#shared/circuit/circuit-file';
import type { SheetSettings } from '#shared/circuit/drawing';
import { formatExact, formatValue } from '#shared/units/format-value';
import { type ParsedValue, parseValue } from '#shared/units/parse-value';
import type { SheetCommands } from '../../live/sheet-commands';
import { ValueField } from '../../ui/value-field';
import { useIsOtherPoint, useProblems, useShownPoint, useSolution, useSolvedCircuit } from '../../workers/solution';
import { OperatingPoints } from './operating-points';
import { ProblemSummary } from './problem-summary';
import { sheetSummary } from './sheet-summary';
import { VerdictCounts } from './verdict-counts';

/** The sheet in one line: which operating point is shown, its temperature, the current and power its sources deliver, how its devices stand, and what is wrong. */
export function MastheadFigures({ settings, commands }: { settings: SheetSettings; commands: SheetCommands }) {
  const solution = useSolution();
  const circuit = useSolvedCircuit();
  const record = 'record' in solution && circuit && circuit.parts.length > 0 ? solution.record : undefined;
  const point = useShownPoint();
  const problems = useProblems();
  const elsewhere = useIsOtherPoint();
  const summary = circuit && record && point ? sheetSummary(circuit, point) : undefined;
  const busy = solution.state === 'outdated' || solution.state === 'pending';
  return (
    <div className="flex flex-wrap items-center gap-x-5 gap-y-1">
      {/* First, so that nothing else moves when further points are found. */}
      <OperatingPoints />
      <Temperature celsius={settings.temperature} commands={commands} />
      <div aria-busy={busy} className={`contents *:transition-opacity ${busy ? '*:opacity-45 *:delay-150' : ''}`}>
        {summary && (summary.power > 0 || elsewhere) && (
          <p
            className="whitespace-nowrap"
            title={`${formatValue(summary.current, 'A', 4)}: the sum of the currents that the voltage sources deliver. ${formatValue(summary.power, 'W', 4)}: the power that all sources deliver together.`}
          >
            <span className="sr-only">supply current </span>
            {formatValue(summary.current, 'A')}
            <span aria-hidden="true" className="px-2 text-faint">
              ·
            </span>
            <span className="sr-only">, power delivered by all sources </span>
            {formatValue(summary.power, 'W')}
          </p>
        )}
        {summary && <VerdictCounts counts={summary.verdicts} />}
        {solution.state === 'failed' && <p className="max-w-96 text-missed text-xs">{solution.reason}</p>}
        {record && <ProblemSummary status={record.status} problems={problems} />}
        {elsewhere && (
          <p className="text-faint" title="Remarks on devices and nets are made for the first point alone.">
            remarks –
          </p>
        )}
      </div>
    </div>
  );
}

function Temperature({ celsius, commands }: { celsius: number; commands: SheetCommands }) {
  if (!commands.canEdit) return <p>{formatExact(celsius, '°C')}</p>;
  return (
    <div className="w-18">
      <ValueField
        label="Temperature"
        hideLabel
        value={celsius}
        show={(value) => formatExact(value, '°C')}
        read={readTemperature}
        onCommit={commands.setTemperature}
      />
    </div>
  );
}

function readTemperature(text: string): ParsedValue {
  const reading = parseValue(text, { unit: '°C' });
  if (!reading.ok || reading.value > ABSOLUTE_ZERO) return reading;
  return { ok: false, reason: `Absolute zero is ${ABSOLUTE_ZERO} °C: write a temperature above it.` };
}
