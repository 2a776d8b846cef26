import { pictureUrl, type Picture } from '#shared/api/pictures.ts';

interface Props {
  readonly picture: Picture;
  readonly name: string;
}

/** A kiln as it looks. */
export function KilnPhotograph({ picture, name }: Props) {
  const largest = picture.widths.at(-1);
  if (largest === undefined) return null;
  return (
    <img
      src={pictureUrl(picture.name, largest)}
      srcSet={picture.widths
        .map((width) => `${pictureUrl(picture.name, width)} ${String(width)}w`)
        .join(', ')}
      sizes="(min-width: 64rem) 26rem, 100vw"
      width={picture.width}
      height={picture.height}
      alt={`The kiln ${name}`}
      loading="lazy"
      className="h-auto w-full max-w-[26rem] bg-ash-2"
    />
  );
}
