// Entry of the server bundle that VS Code forks.
import { serveAsArgued } from './node.ts';

serveAsArgued();
