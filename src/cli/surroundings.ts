/** Where a command writes, and the folder that the project lies in. */
export interface Surroundings {
  stdout: (text: string) => void;
  stderr: (text: string) => void;
  root: string;
}
