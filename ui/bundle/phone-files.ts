/** The part of Vite's manifest that is read here: one chunk of the build. */
export interface ManifestChunk {
  file: string;
  isEntry?: boolean;
  imports?: string[];
  dynamicImports?: string[];
  css?: string[];
  assets?: string[];
}

/** Vite's manifest: chunks by the source they begin with. */
export type BuildManifest = Readonly<Record<string, ManifestChunk>>;

/** Pages a crew opens on the phone; everything else the router can load belongs to the desk. */
const PHONE_PAGES = /^src\/app\/routes\/(my(-[a-z-]+)?|sign-in|me|help|accessibility|not-found)-page\.tsx$/;

/** Our own sources. The component library can load all its icons by name; no page of ours asks it to. */
const OWN_SOURCE = /^src\//;

/** Fonts and pictures that the phone's pages show; the icon fonts of the component library are not among them. */
const PHONE_ASSETS = /\.(woff2|svg|png)$/;
const OTHER_ASSETS = /blueprint-icons/;

/**
 * Files of a build that the phone needs to work without a signal: the entry with everything it imports, the phone's pages
 * with everything they import now or later, their styles and fonts.
 */
export function phoneFiles(manifest: BuildManifest): Set<string> {
  const files = new Set<string>();
  const seen = new Set<string>();
  const visit = (key: string): void => {
    const chunk = manifest[key];
    if (chunk === undefined || seen.has(key)) return;
    seen.add(key);
    files.add(chunk.file);
    for (const style of chunk.css ?? []) files.add(style);
    for (const asset of chunk.assets ?? []) {
      if (PHONE_ASSETS.test(asset) && !OTHER_ASSETS.test(asset)) files.add(asset);
    }
    chunk.imports?.forEach(visit);
    // The entry names every page of the app; of those only the phone's are followed.
    const wanted = isEntry(chunk) ? PHONE_PAGES : OWN_SOURCE;
    chunk.dynamicImports?.filter((each) => wanted.test(each)).forEach(visit);
  };
  for (const [key, chunk] of Object.entries(manifest)) if (isEntry(chunk)) visit(key);
  return files;
}

const isEntry = (chunk: ManifestChunk): boolean => chunk.isEntry === true;
