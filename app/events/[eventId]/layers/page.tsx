export { LayersPage as default } from '../../../layers/LayersPage';
