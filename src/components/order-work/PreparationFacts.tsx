import type { PreparationView } from '@/lib/orders/views';
import { angleWords, pitchWords } from '@/lib/orders/sentence';
import type { PassReport } from '@/lib/prepare/report';
import { durationWords } from '../time-words';

/** Facts as a ledger of pairs. */
export function Pairs({ pairs }: { pairs: readonly (readonly [string, React.ReactNode])[] }) {
  return (
    <dl className="pairs">
      {pairs.map(([name, value]) => (
        <div key={name}>
          <dt>{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}

const bytesWords = (bytes: number): string =>
  bytes < 100_000 ? `${(bytes / 1000).toFixed(1)} kB` : `${(bytes / 1e6).toFixed(2)} MB`;

export function passWords(pass: PassReport): string {
  return [
    `${pass.lines.toLocaleString('en-GB')} lines at ${angleWords(pass.directionDeg)}`,
    `${pitchWords(pass.linePitchMm)} apart`,
    `${pass.pixelsAlong.toLocaleString('en-GB')} pixels along a line`,
    ...(pass.doseJPerMm2 === null
      ? []
      : [`${pass.doseJPerMm2.toFixed(3)} J/mm²${pass.assumesLinearPower ? ', assumes linear power' : ''}`]),
    ...(pass.runOffMm === null ? [] : [`run-off ${pass.runOffMm.toFixed(1)} mm`]),
    ...(pass.scanSeconds === null ? [] : [durationWords(pass.scanSeconds)]),
  ].join(', ');
}

function tracePairs(preparation: PreparationView): [string, string][] {
  const trace = preparation.report?.trace;
  if (!trace) return [];
  const boundary =
    trace.meanBoundaryMm === null ? '' : `, ${trace.meanBoundaryMm.toFixed(3)} mm from the mask on average`;
  return [
    [
      'Linework',
      `${trace.method}: ${trace.paths.toLocaleString('en-GB')} paths, ${trace.nodes.toLocaleString('en-GB')} nodes, ${trace.lengthMm.toFixed(0)} mm long, ${trace.islandsDropped} islands dropped${boundary}`,
    ],
  ];
}

/** What the preparation gave: passes, dose, time, and the files for the machine. */
export function PreparationFacts({ preparation }: { preparation: PreparationView }) {
  const { report, files } = preparation;
  if (!report) return null;
  const linear = report.passes.some((p) => p.assumesLinearPower && p.doseJPerMm2 !== null);
  return (
    <section aria-label="What was prepared" className="flex flex-col gap-6">
      <h2>What was prepared</h2>
      <Pairs
        pairs={[
          ['Size', `${Number(report.widthMm.toFixed(2))} × ${Number(report.heightMm.toFixed(2))} mm`],
          ...report.passes.map(
            (pass) => [report.passes.length > 1 ? `Pass ${pass.pass}` : 'Pass', passWords(pass)] as const,
          ),
          ...tracePairs(preparation),
          ...(report.totalDoseJPerMm2 === null
            ? []
            : [
                [
                  'Dose in all',
                  `${report.totalDoseJPerMm2.toFixed(3)} J/mm²${linear ? ', assumes linear power' : ''}`,
                ] as const,
              ]),
          ...(report.totalSeconds === null
            ? []
            : [['Time a piece', durationWords(report.totalSeconds)] as const]),
        ]}
      />
      <div>
        <h3 className="pb-2">Files for the machine</h3>
        <FileList files={files} />
      </div>
    </section>
  );
}

export function FileList({ files }: { files: PreparationView['files'] }) {
  return (
    <ul className="flex flex-col">
      {files.map((file) => (
        <li
          key={file.name}
          className="flex flex-wrap items-baseline justify-between gap-x-6 border-b border-hair py-2.5"
        >
          <a href={file.url} download={file.name} className="link break-all py-1 text-15">
            {file.name}
          </a>
          <span className="figure text-13 text-quiet">
            {bytesWords(file.bytes)}, SHA-256 {file.sha256.slice(0, 12)}
          </span>
        </li>
      ))}
    </ul>
  );
}
