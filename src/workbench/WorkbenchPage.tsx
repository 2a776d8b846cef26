import { SpyholeMark } from '../ui/SpyholeMark.tsx';
import { ThemeSwitch } from '../ui/ThemeSwitch.tsx';
import { FieldsBench } from './FieldsBench.tsx';
import { HeatBench } from './HeatBench.tsx';

/** Every shared component in every state, with invented data. Not part of the built site. */
export function WorkbenchPage() {
  return (
    <div className="mx-auto max-w-page px-4 pb-24 sm:px-8">
      <header className="flex items-center justify-between border-b border-line py-4">
        <p className="flex items-center gap-2.5 text-lead font-[700] tracking-[-0.02em]">
          <SpyholeMark />
          Spyhole
          <span className="font-[400] text-soot-2">workbench</span>
        </p>
        <ThemeSwitch />
      </header>
      <main className="space-y-20 pt-10">
        <h1 className="sr-only">Workbench</h1>
        <HeatBench />
        <FieldsBench />
      </main>
    </div>
  );
}
