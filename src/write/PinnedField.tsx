import type { ReactNode } from 'react';

/** Says which field of the note stands here, so that a check or a remark can lead to it. */
export function PinnedField(props: { readonly pointer: string; readonly children: ReactNode }) {
  return <div data-pointer={props.pointer}>{props.children}</div>;
}
