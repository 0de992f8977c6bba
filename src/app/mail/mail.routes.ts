import { type Routes } from '@angular/router';

export default [
  {
    path: '',
    title: 'Mail',
    loadComponent: () => import('./mail-page/mail-page').then((file) => file.MailPage),
  },
  {
    path: 'received/:id',
    title: 'Received message',
    loadComponent: () => import('./received-page/received-page').then((file) => file.ReceivedPage),
  },
  {
    path: ':id',
    title: 'Message',
    loadComponent: () => import('./message-page/message-page').then((file) => file.MessagePage),
  },
] satisfies Routes;
