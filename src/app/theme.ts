import { applyTheme } from '#src/lib/theme.ts';

// Before the first paint of the application, so that nobody is dazzled on the way in.
applyTheme();
