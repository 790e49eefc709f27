import type { ComponentProps } from 'react';
import { controlLook } from './controlLook.ts';

export function TextInput({ className = '', type = 'text', ...rest }: ComponentProps<'input'>) {
  return <input {...rest} type={type} className={`${controlLook} ${className}`} />;
}
