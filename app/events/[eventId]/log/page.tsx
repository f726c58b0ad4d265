export { LogPage as default } from '../../../log/LogPage';
