'use client';

import { TextField } from '@/app/_components/ui/field';
import { DoorForm } from '../_components/door-form';
import { PasswordField } from '../_components/password-field';
import { signIn } from '../actions';

export function SignInForm() {
  return (
    <DoorForm
      action={signIn}
      words={['Sign in', 'Signing in']}
      fields={({ errors, values }) => (
        <>
          <TextField
            label="E-mail address"
            name="email"
            type="email"
            autoComplete="username"
            defaultValue={values.email}
            error={errors.email}
          />
          <PasswordField autoComplete="current-password" error={errors.password} />
        </>
      )}
    />
  );
}
