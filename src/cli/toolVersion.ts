declare const OHMWARD_VERSION: string | undefined;

/** That of the package; the build writes it in, and the source as tests run it has none. */
export const toolVersion = (): string => (typeof OHMWARD_VERSION === 'undefined' ? '0.0.0' : OHMWARD_VERSION);
