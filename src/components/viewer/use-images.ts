import { useEffect, useState } from 'react';

export interface LoadedImage {
  image: HTMLImageElement | null;
  failed: boolean;
}

const WAITING: LoadedImage = { image: null, failed: false };

/** Decoded pictures by address; an address stays once loaded, so that going back to it does not flicker. */
export function useImages(urls: readonly (string | null)[]): (url: string | null) => LoadedImage {
  const [loaded, setLoaded] = useState<Record<string, LoadedImage>>({});
  const wanted = urls.filter((url): url is string => url !== null).join('\n');
  useEffect(() => {
    let left = false;
    for (const url of wanted.split('\n').filter(Boolean)) {
      const image = new Image();
      image.decoding = 'async';
      image.onload = () => !left && setLoaded((known) => ({ ...known, [url]: { image, failed: false } }));
      image.onerror = () =>
        !left && setLoaded((known) => ({ ...known, [url]: { image: null, failed: true } }));
      image.src = url;
    }
    return () => {
      left = true;
    };
  }, [wanted]);
  return (url) => (url === null ? WAITING : (loaded[url] ?? WAITING));
}
