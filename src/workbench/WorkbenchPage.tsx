import { FieldsBench } from './FieldsBench.tsx';
import { HeatBench } from './HeatBench.tsx';
import { PageBench } from './PageBench.tsx';
import { RecordBench } from './RecordBench.tsx';

/** Every shared component in its states, with invented data. For development only. */
export function WorkbenchPage() {
  return (
    <div className="space-y-20">
      <h1 className="text-title">Workbench</h1>
      <HeatBench />
      <RecordBench />
      <FieldsBench />
      <PageBench />
    </div>
  );
}
