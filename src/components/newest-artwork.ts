import type { ArtworkView } from '@/lib/orders/views';

/** The artwork version that counts. */
export function newestArtwork(artworks: readonly ArtworkView[]): ArtworkView | null {
  return artworks.reduce<ArtworkView | null>(
    (newest, artwork) => (newest && newest.version > artwork.version ? newest : artwork),
    null,
  );
}

/** Address of the artwork's picture as it is placed; another size or turn gives another address, so that no old one stays. */
export function pictureOf(artwork: ArtworkView | null): string | null {
  if (!artwork?.pictureUrl) return null;
  const { check } = artwork;
  return check
    ? `${artwork.pictureUrl}?placed=${check.widthMm.toFixed(2)}x${check.heightMm.toFixed(2)}`
    : artwork.pictureUrl;
}
