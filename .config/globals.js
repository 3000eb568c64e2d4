/** The globals that the scripts in plain JavaScript use; TypeScript checks the rest itself. */
export default {
  process: 'readonly',
  console: 'readonly',
  URL: 'readonly',
  fetch: 'readonly',
  setTimeout: 'readonly',
};
