import { type Routes } from '@angular/router';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: ':waveform',
    title: 'Waveform',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./waveform-page/waveform-page').then((file) => file.WaveformPage),
  },
] satisfies Routes;
