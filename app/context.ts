import { createContext } from 'react-router';
import { PUBLIC, type Viewer } from '#domain/viewer.ts';

/** Who is asking; set by the root middleware before any loader or action runs. */
export const viewerContext = createContext<Viewer>(PUBLIC);
