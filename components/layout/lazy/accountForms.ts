/** The forms of signing in and up, loaded when one of them is opened: only they need the form library. */
export { FirstAccountScreen } from '../../account/FirstAccountScreen';
export { ForgotPasswordScreen, ResetPasswordScreen } from '../../account/PasswordScreens';
export { SignInScreen } from '../../account/SignInScreen';
export { SignUpScreen } from '../../account/SignUpScreen';
