import { redirect } from 'next/navigation';
import { currentActor } from './session';

export default async function Start() {
  redirect((await currentActor()) ? '/jobs' : '/sign-in');
}
