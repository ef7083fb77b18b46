import { Module } from '@nestjs/common';
import { FileStore } from './file-store.js';

@Module({ providers: [FileStore], exports: [FileStore] })
export class FilesModule {}
