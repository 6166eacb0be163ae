package org.wintersill.io.netcdf;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.MappedByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.NonWritableChannelException;
import java.nio.channels.ReadableByteChannel;
import java.nio.channels.WritableByteChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/**
 * A file for jHDF that refuses at once what lies beyond its end. jHDF takes lengths from the file as they are; without
 * this a damaged one costs gigabytes and seconds before it is noticed.
 */
final class BoundedChannel extends FileChannel {
    /** Bytes by which a read may reach over the end: jHDF looks for signatures with buffers of some hundred bytes. */
    private static final int SHORT = 4096;

    private final FileChannel file;
    private final long size;

    BoundedChannel(Path path) throws IOException {
        file = FileChannel.open(path, StandardOpenOption.READ);
        size = file.size();
    }

    private void refuseBeyondEnd(long position, long length) {
        if (position < 0 || length < 0 || position > size - length) {
            throw new IllegalStateException(length + " bytes at " + position + " are beyond the end of the file at " + size);
        }
    }

    @Override
    public int read(ByteBuffer target, long position) throws IOException {
        // short reads at the very end are asked for on purpose, long ones never
        refuseBeyondEnd(position, Math.max(0, target.remaining() - SHORT));
        return file.read(target, position);
    }

    @Override
    public MappedByteBuffer map(MapMode mode, long position, long length) throws IOException {
        refuseBeyondEnd(position, length);
        return file.map(MapMode.READ_ONLY, position, length);
    }

    @Override
    public int read(ByteBuffer target) throws IOException {
        return file.read(target);
    }

    @Override
    public long read(ByteBuffer[] targets, int offset, int length) throws IOException {
        return file.read(targets, offset, length);
    }

    @Override
    public long position() throws IOException {
        return file.position();
    }

    @Override
    public FileChannel position(long position) throws IOException {
        file.position(position);
        return this;
    }

    @Override
    public long size() {
        return size;
    }

    @Override
    public long transferTo(long position, long count, WritableByteChannel target) throws IOException {
        return file.transferTo(position, count, target);
    }

    @Override
    protected void implCloseChannel() throws IOException {
        file.close();
    }

    @Override
    public int write(ByteBuffer source) {
        throw new NonWritableChannelException();
    }

    @Override
    public long write(ByteBuffer[] sources, int offset, int length) {
        throw new NonWritableChannelException();
    }

    @Override
    public int write(ByteBuffer source, long position) {
        throw new NonWritableChannelException();
    }

    @Override
    public FileChannel truncate(long length) {
        throw new NonWritableChannelException();
    }

    @Override
    public void force(boolean metaData) {
        // nothing is ever written
    }

    @Override
    public long transferFrom(ReadableByteChannel source, long position, long count) {
        throw new NonWritableChannelException();
    }

    @Override
    public FileLock lock(long position, long length, boolean shared) {
        throw new NonWritableChannelException();
    }

    @Override
    public FileLock tryLock(long position, long length, boolean shared) {
        throw new NonWritableChannelException();
    }
}
