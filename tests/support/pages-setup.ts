import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { afterEach } from 'vitest';

afterEach(cleanup);

// Only against hanging: what is waited for comes at once, unless the machine is busy with other work.
configure({ asyncUtilTimeout: 20_000 });
