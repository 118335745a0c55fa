import sharp from 'sharp';
const [,,out,W,H,...files]=process.argv; const w=+W,h=+H; const cols=Math.min(files.length, Math.floor(2000/(w+8)));
const rows=Math.ceil(files.length/cols);
await sharp({create:{width:cols*(w+8),height:rows*(h+8),channels:3,background:'#b0b'}}).composite(await Promise.all(files.map(async(f,i)=>({input:await sharp('/tmp/sk/shots/all/'+f+'.png').resize({width:w,height:h,fit:'cover',position:'top'}).toBuffer(),left:(i%cols)*(w+8),top:Math.floor(i/cols)*(h+8)})))).png().toFile('/tmp/sk/shots/'+out+'.png');
