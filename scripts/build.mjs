import { buildProduct } from './build/product.mjs';

await buildProduct();
