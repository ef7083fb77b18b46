import { Body, Controller, Delete, Get, HttpCode, Param, Post, Query, Req, Res } from '@nestjs/common';
import { ApiBearerAuth, ApiBody, ApiConsumes, ApiTags } from '@nestjs/swagger';
import { Throttle } from '@nestjs/throttler';
import { type Actor } from '@tailrace/shared/contracts/policy';
import {
  lookDraft,
  takeInDraft,
  type TakeInDraft,
  trendFile,
  type TrendFile,
  trendFilePage,
  trendFileQuery,
  type TrendFileQuery,
  trendLook,
  type TrendLook,
} from '@tailrace/shared/contracts/trends';
import { type Request, type Response } from 'express';
import { type z } from 'zod';
import { FileStore } from '../files/file-store.js';
import { Allow, Who } from '../platform/access.js';
import { Returns } from '../platform/returns.js';
import { receiveUpload } from './receive-upload.js';
import { TrendsService } from './trends.service.js';

const uploadForm = {
  type: 'object',
  required: ['file'],
  properties: {
    file: { type: 'string', format: 'binary' },
    areaId: { type: 'string', format: 'uuid', description: 'needed where the person has more than one area' },
  },
};

@ApiTags('trends')
@ApiBearerAuth()
@Controller('trends')
export class TrendsController {
  constructor(
    private readonly trends: TrendsService,
    private readonly files: FileStore,
  ) {}

  /** The trend files of the asker's areas, newest first. */
  @Get()
  @Allow('trends:read')
  @Returns(trendFilePage)
  page(
    @Who() actor: Actor,
    @Query({ schema: trendFileQuery }) query: TrendFileQuery,
  ): Promise<z.infer<typeof trendFilePage>> {
    return this.trends.page(actor, query);
  }

  /** Sends a trend file. It is kept as it is; the same bytes again answer the file that is there, with 200. */
  @Post()
  @Allow('trends:take-in')
  @Throttle({ default: { limit: 120, ttl: 60_000 } })
  @ApiConsumes('multipart/form-data')
  @ApiBody({ schema: uploadForm })
  @Returns(trendFile, 201)
  async receive(
    @Who() actor: Actor,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<TrendFile> {
    const { name, fields, received } = await receiveUpload(request, (bytes) => this.files.receive(bytes));
    try {
      const areaId = await this.trends.areaFor(actor, fields.get('areaId'));
      const { file, known } = await this.trends.keep(actor, { ...received, name, areaId });
      response.status(known ? 200 : 201);
      return file;
    } catch (error) {
      await this.files.remove(received.key);
      throw error;
    }
  }

  @Get(':id')
  @Allow('trends:read')
  @Returns(trendFile)
  byId(@Who() actor: Actor, @Param('id') id: string): Promise<TrendFile> {
    return this.trends.byId(actor, id);
  }

  /** The first rows as they will be understood: by the plan sent, or by a guessed one. */
  @Post(':id/look')
  @Allow('trends:take-in')
  @HttpCode(200)
  @Returns(trendLook)
  look(
    @Who() actor: Actor,
    @Param('id') id: string,
    @Body({ schema: lookDraft }) { plan }: z.infer<typeof lookDraft>,
  ): Promise<TrendLook> {
    return this.trends.look(actor, id, plan);
  }

  /** Binds tags and has the file read; its progress and report are on the file. */
  @Post(':id/take-in')
  @Allow('trends:take-in')
  @HttpCode(202)
  @Returns(trendFile, 202)
  async takeIn(
    @Who() actor: Actor,
    @Param('id') id: string,
    @Body({ schema: takeInDraft }) draft: TakeInDraft,
  ): Promise<TrendFile> {
    const { file } = await this.trends.takeIn(actor, id, draft);
    return file;
  }

  /** Forgets a file that was only received, or refused. */
  @Delete(':id')
  @Allow('trends:take-in')
  @HttpCode(204)
  async remove(@Who() actor: Actor, @Param('id') id: string): Promise<void> {
    await this.trends.remove(actor, id);
  }
}
