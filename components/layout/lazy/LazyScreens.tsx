import { lazy, Suspense, type ComponentType } from 'react';
import { Screen } from '../Screen';
import { Skeleton } from '../../ui/Skeleton';

/** A screen that is loaded when it is first opened; until then its place is kept. */
function loadedWhenOpened<Props extends object>(title: string, load: () => Promise<ComponentType<Props>>): ComponentType<Props> {
  const Loaded = lazy(async () => ({ default: await load() }));
  return function LazyScreen(props: Props) {
    return (
      <Suspense
        fallback={
          <Screen title={title}>
            <Skeleton />
          </Screen>
        }
      >
        <Loaded {...props} />
      </Suspense>
    );
  };
}

const counting = () => import('./countingScreens');
export const BenchScreen = loadedWhenOpened('Bench', async () => (await counting()).BenchScreen);
export const ReviewScreen = loadedWhenOpened('Review', async () => (await counting()).ReviewScreen);
export const SubmissionScreen = loadedWhenOpened('Submission', async () => (await counting()).SubmissionScreen);

const forms = () => import('./accountForms');
export const FirstAccountScreen = loadedWhenOpened('First account', async () => (await forms()).FirstAccountScreen);
export const ForgotPasswordScreen = loadedWhenOpened('Forgotten password', async () => (await forms()).ForgotPasswordScreen);
export const ResetPasswordScreen = loadedWhenOpened('New password', async () => (await forms()).ResetPasswordScreen);
export const SignInScreen = loadedWhenOpened('Sign in', async () => (await forms()).SignInScreen);
export const SignUpScreen = loadedWhenOpened('Sign up', async () => (await forms()).SignUpScreen);
