import type { Prescription, Role } from '../../../engine/index.ts';

interface PrescriptionTableProps {
  readonly read: Prescription;
  /** Says what the column `at` of the text holds. */
  readonly onRole: (at: number, role: Role) => void;
}

const ROLES: readonly { readonly role: Role; readonly words: string }[] = [
  { role: 'radius', words: 'radius' },
  { role: 'thickness', words: 'thickness' },
  { role: 'medium', words: 'index or glass' },
  { role: 'abbe', words: 'Abbe number' },
  { role: 'diameter', words: 'clear diameter' },
  { role: 'semiDiameter', words: 'half clear diameter' },
  { role: 'conic', words: 'conic constant' },
  { role: 'number', words: 'number' },
  { role: 'unused', words: 'not used' },
];

/** How a pasted table is read: quantities as rows, surfaces as columns, each cell with its reading over its text. */
export function PrescriptionTable({ read, onRole }: PrescriptionTableProps) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard (WCAG 2.1.1)
    <section className="paste-scroll" tabIndex={0} aria-label="How the table is read">
      <table className="paste-table">
        <thead>
          <tr>
            <td />
            {read.rows.map(({ line, becomes }) => (
              <th key={line} scope="col">
                {becomes}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {read.roles.map((role, at) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: a column of the text is its place
            <tr key={at}>
              <th scope="row">
                <select
                  className="field-input"
                  aria-label={`What column ${at + 1} holds`}
                  value={role}
                  onChange={(event) => {
                    const chosen = ROLES.find((choice) => choice.role === event.target.value);
                    if (chosen) onRole(at, chosen.role);
                  }}
                >
                  {ROLES.map((choice) => (
                    <option key={choice.role} value={choice.role}>
                      {choice.words}
                    </option>
                  ))}
                </select>
              </th>
              {read.rows.map(({ line, cells }) => {
                const cell = cells[at];
                return (
                  <td key={line} className={cell?.fault ? 'paste-bad' : undefined}>
                    <span className="paste-reading">{cell?.words}</span>
                    <span className="paste-typed">{cell?.text}</span>
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
