export { SignInPage as default } from '#src/features/session/components/SignInPage.tsx';
