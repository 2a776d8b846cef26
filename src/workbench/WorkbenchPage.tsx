import { MessagesProvider } from '../ui/MessagesProvider.tsx';
import { SkipLink } from '../ui/SkipLink.tsx';
import { SpyholeMark } from '../ui/SpyholeMark.tsx';
import { ThemeSwitch } from '../ui/ThemeSwitch.tsx';
import { FieldsBench } from './FieldsBench.tsx';
import { HeatBench } from './HeatBench.tsx';
import { PageBench } from './PageBench.tsx';
import { RecordBench } from './RecordBench.tsx';

/** Every shared component in its states, with invented data. For development only. */
export function WorkbenchPage() {
  return (
    <MessagesProvider>
      <SkipLink to="#bench">To the components</SkipLink>
      <div className="mx-auto max-w-page px-4 pb-24 sm:px-8">
        <header className="flex flex-wrap items-center justify-between gap-3 border-b border-line py-4">
          <p className="flex items-center gap-2.5 text-lead font-[700] tracking-[-0.02em]">
            <SpyholeMark />
            Spyhole
            <span className="font-[400] text-soot-2">workbench</span>
          </p>
          <ThemeSwitch />
        </header>
        <main id="bench" tabIndex={-1} className="space-y-20 pt-10">
          <h1 className="sr-only">Workbench</h1>
          <HeatBench />
          <RecordBench />
          <FieldsBench />
          <PageBench />
        </main>
      </div>
    </MessagesProvider>
  );
}
