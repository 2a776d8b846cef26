import { Icon } from '../ui/Icon.tsx';

/** The caution of a change that can hurt somebody, always beside it. */
export function ChangeCaution({ caution }: { readonly caution: string | null }) {
  if (caution === null) return null;
  return (
    <p className="flex max-w-measure gap-2 text-small text-caution">
      <Icon name="look-again" className="mt-0.5 size-4.5" />
      <span>
        <strong className="font-[650]">Take care.</strong> {caution}
      </span>
    </p>
  );
}
