import { lazy, Suspense } from 'react';
import { Skeleton } from '../../ui/Skeleton.tsx';
import { LineAt } from '../FieldsAt.tsx';
import { useWriteForm } from '../form-context.ts';
import { PinnedField } from '../PinnedField.tsx';
import { WriteSection } from '../WriteSection.tsx';

const StoryEditor = lazy(() =>
  import('./StoryEditor.tsx').then((module) => ({ default: module.StoryEditor })),
);

/** The note's title and its story. */
export function StorySection() {
  const { fields, change } = useWriteForm();
  return (
    <WriteSection
      id="story"
      title="Story"
      lead="What somebody with the same kiln would want to know: what you set out to do, what happened, what you would change."
    >
      <LineAt
        pointer="/title"
        label="Title"
        required
        maxLength={120}
        value={fields.title}
        onValue={(title) => change((before) => ({ ...before, title }))}
      />
      <PinnedField pointer="/story">
        <Suspense
          fallback={<Skeleton words="The editor is being fetched" shape="text" count={6} />}
        >
          <StoryEditor />
        </Suspense>
      </PinnedField>
    </WriteSection>
  );
}
