/** Version of the program, as package.json has it (a test compares them); bundled code cannot read that file. */
export const version = '0.1.0';
