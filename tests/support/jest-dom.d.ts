// jest loads the matchers (setupFilesAfterEnv); this tells TypeScript that they are there.
import '@testing-library/jest-dom';
