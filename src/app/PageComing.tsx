import { Skeleton } from '../ui/Skeleton.tsx';

/** Stands in the frame while the page's own code is on its way. */
export function PageComing() {
  return <Skeleton words="The page is being fetched" shape="text" />;
}
