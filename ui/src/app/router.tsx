import { Navigate, type RouteObject } from 'react-router-dom';
import { AnyShell } from './any-shell';
import { Permitted, SignedInOnly, ToBoard, ToHome } from './guards';
import { PhoneShell } from './phone-shell';
import { PlainShell } from './plain-shell';
import { NotFoundPage } from './routes/not-found-page';
import { PageOnItsWay, RouteFault } from './route-fault';

const deskShell = () => import('./desk-shell').then(({ DeskShell }) => ({ Component: DeskShell }));
const boardPage = () => import('./routes/board-page').then(({ BoardPage }) => ({ Component: BoardPage }));
const alertsPage = () => import('./routes/alerts-page').then(({ AlertsPage }) => ({ Component: AlertsPage }));
const alertQualityPage = () =>
  import('./routes/alert-quality-page').then(({ AlertQualityPage }) => ({ Component: AlertQualityPage }));
const historyPage = () =>
  import('./routes/history-page').then(({ HistoryPage }) => ({ Component: HistoryPage }));
const correctionsPage = () =>
  import('./routes/corrections-page').then(({ CorrectionsPage }) => ({ Component: CorrectionsPage }));
const checkLogPage = () =>
  import('./routes/check-log-page').then(({ CheckLogPage }) => ({ Component: CheckLogPage }));
const timetablesPage = () =>
  import('./routes/timetables-page').then(({ TimetablesPage }) => ({ Component: TimetablesPage }));
const setupPage = () => import('./routes/setup-page').then(({ SetupPage }) => ({ Component: SetupPage }));
const myPage = () => import('./routes/my-page').then(({ MyPage }) => ({ Component: MyPage }));
const myTurnPage = () =>
  import('./routes/my-turn-page').then(({ MyTurnPage }) => ({ Component: MyTurnPage }));
const turnAtHandPage = () =>
  import('./routes/turn-at-hand-page').then(({ TurnAtHandPage }) => ({ Component: TurnAtHandPage }));
const myTieUpPage = () =>
  import('./routes/my-tie-up-page').then(({ MyTieUpPage }) => ({ Component: MyTieUpPage }));
const myOutboxPage = () =>
  import('./routes/my-outbox-page').then(({ MyOutboxPage }) => ({ Component: MyOutboxPage }));
const rosterPage = () => import('./routes/roster-page').then(({ RosterPage }) => ({ Component: RosterPage }));
const boxesPage = () => import('./routes/boxes-page').then(({ BoxesPage }) => ({ Component: BoxesPage }));
const takingPage = () => import('./routes/taking-page').then(({ TakingPage }) => ({ Component: TakingPage }));
const peoplePage = () => import('./routes/people-page').then(({ PeoplePage }) => ({ Component: PeoplePage }));
const mePage = () => import('./routes/me-page').then(({ MePage }) => ({ Component: MePage }));
const signInPage = () =>
  import('./routes/sign-in-page').then(({ SignInPage }) => ({ Component: SignInPage }));
const welcomePage = () =>
  import('./routes/welcome-page').then(({ WelcomePage }) => ({ Component: WelcomePage }));
const linkPage = () => import('./routes/link-page').then(({ LinkPage }) => ({ Component: LinkPage }));
const helpPage = () => import('./routes/help-page').then(({ HelpPage }) => ({ Component: HelpPage }));
const keysPage = () => import('./routes/keys-page').then(({ KeysPage }) => ({ Component: KeysPage }));
const accessibilityPage = () =>
  import('./routes/accessibility-page').then(({ AccessibilityPage }) => ({ Component: AccessibilityPage }));

const deskPages: RouteObject[] = [
  {
    element: <Permitted permission="board.read" />,
    children: [
      { path: '/board', element: <ToBoard /> },
      { path: '/board/:terminal', lazy: boardPage },
      { path: '/turns/:turnId', lazy: boardPage },
    ],
  },
  { element: <Permitted permission="alerts.read" />, children: [{ path: '/alerts', lazy: alertsPage }] },
  {
    element: <Permitted permission="history.read" />,
    children: [
      { path: '/alerts/quality', lazy: alertQualityPage },
      { path: '/history', lazy: historyPage },
    ],
  },
  {
    element: <Permitted permission="corrections.read" />,
    children: [
      { path: '/records', element: <Navigate to="/records/corrections" replace /> },
      { path: '/records/corrections', lazy: correctionsPage },
    ],
  },
  {
    element: <Permitted permission="records.read" />,
    children: [{ path: '/records/check', lazy: checkLogPage }],
  },
  {
    element: <Permitted permission="timetables.read" />,
    children: [{ path: '/timetables/*', lazy: timetablesPage }],
  },
  { element: <Permitted permission="plans.read" />, children: [{ path: '/setup', lazy: setupPage }] },
  {
    element: <Permitted permission="roster.read" />,
    children: [{ path: '/desk/roster', lazy: rosterPage }],
  },
  {
    element: <Permitted permission="messages.read" />,
    children: [{ path: '/status/boxes', lazy: boxesPage }],
  },
  { element: <Permitted permission="people.manage" />, children: [{ path: '/people', lazy: peoplePage }] },
];

const phonePages: RouteObject[] = [
  {
    element: <Permitted permission="entries.record" />,
    children: [
      { path: '/my', lazy: myPage },
      { path: '/my/turn', lazy: turnAtHandPage },
      { path: '/my/turn/:turnId', lazy: myTurnPage },
      { path: '/my/outbox', lazy: myOutboxPage },
      { path: '/my/tie-up', lazy: myTieUpPage },
    ],
  },
];

/** Every page, in the bars it stands in. Pages load when they are opened; the phone never loads the desk's. */
export const routes: RouteObject[] = [
  {
    errorElement: <RouteFault />,
    hydrateFallbackElement: <PageOnItsWay />,
    children: [
      {
        element: <SignedInOnly />,
        children: [
          { path: '/', element: <ToHome /> },
          { lazy: deskShell, children: deskPages },
          { element: <PhoneShell />, children: phonePages },
          { element: <AnyShell />, children: [{ path: '/me', lazy: mePage }] },
        ],
      },
      {
        element: <AnyShell />,
        children: [
          { path: '/help', lazy: helpPage },
          { path: '/keys', lazy: keysPage },
          { path: '/accessibility', lazy: accessibilityPage },
          { path: '*', element: <NotFoundPage /> },
        ],
      },
      {
        element: <PlainShell />,
        children: [
          { path: '/sign-in', lazy: signInPage },
          { path: '/welcome', lazy: welcomePage },
          { path: '/link/:token', lazy: linkPage },
          { path: '/links/:token', lazy: linkPage },
          { path: '/t/:token', lazy: takingPage },
        ],
      },
    ],
  },
];
