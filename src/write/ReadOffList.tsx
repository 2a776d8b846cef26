import { findingText } from '#shared/firing/findings.ts';
import { useWriteForm } from './form-context.ts';

/** All that was read off the record, in sentences, while it is typed. */
export function ReadOffList() {
  const { reading, units } = useWriteForm();
  if (reading.findings.length === 0) return null;
  return (
    <div className="max-w-measure pt-6">
      <h3 className="text-body">What is read off it</h3>
      <ul className="text-small">
        {reading.findings.map((finding) => (
          <li
            key={`${finding.code}-${String(finding.fromMinute)}`}
            className={`border-b border-line py-1.5 ${finding.trouble ? 'font-[600]' : ''}`}
          >
            {findingText(finding, units)}
          </li>
        ))}
      </ul>
    </div>
  );
}
