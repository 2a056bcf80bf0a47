import type { ArtworkView } from '@/lib/orders/views';

/** The artwork version that counts. */
export function newestArtwork(artworks: readonly ArtworkView[]): ArtworkView | null {
  return artworks.reduce<ArtworkView | null>(
    (newest, artwork) => (newest && newest.version > artwork.version ? newest : artwork),
    null,
  );
}
