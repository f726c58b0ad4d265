export { BoardPage as default } from '../../board/BoardPage';
