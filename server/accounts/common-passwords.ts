/**
 * The most used passwords of leaked collections, most used first: the frequency list of zxcvbn 4.4.2, shortened to its
 * first entries of at least four characters (4000). Nobody may build a password of these alone.
 *
 * Copyright (c) 2012-2016 Dan Wheeler and Dropbox, Inc.
 *
 * Permission is hereby granted, free of charge, to any person obtaining
 * a copy of this software and associated documentation files (the
 * "Software"), to deal in the Software without restriction, including
 * without limitation the rights to use, copy, modify, merge, publish,
 * distribute, sublicense, and/or sell copies of the Software, and to
 * permit persons to whom the Software is furnished to do so, subject to
 * the following conditions:
 *
 * The above copyright notice and this permission notice shall be
 * included in all copies or substantial portions of the Software.
 *
 * THE SOFTWARE IS PROVIDED "AS IS", WITHOUT WARRANTY OF ANY KIND,
 * EXPRESS OR IMPLIED, INCLUDING BUT NOT LIMITED TO THE WARRANTIES OF
 * MERCHANTABILITY, FITNESS FOR A PARTICULAR PURPOSE AND
 * NONINFRINGEMENT. IN NO EVENT SHALL THE AUTHORS OR COPYRIGHT HOLDERS BE
 * LIABLE FOR ANY CLAIM, DAMAGES OR OTHER LIABILITY, WHETHER IN AN ACTION
 * OF CONTRACT, TORT OR OTHERWISE, ARISING FROM, OUT OF OR IN CONNECTION
 * WITH THE SOFTWARE OR THE USE OR OTHER DEALINGS IN THE SOFTWARE.
 */
const list = `
123456 password 12345678 qwerty 123456789 12345 1234 111111 1234567 dragon 123123 baseball abc123 football monkey letmein shadow
master 696969 mustang 666666 qwertyuiop 123321 1234567890 pussy superman 654321 1qaz2wsx 7777777 fuckyou qazwsx jordan 123qwe
000000 killer trustno1 hunter harley zxcvbnm asdfgh buster batman soccer tigger charlie sunshine iloveyou fuckme ranger hockey
computer starwars asshole pepper klaster 112233 zxcvbn freedom princess maggie pass ginger 11111111 131313 fuck love cheese
159753 summer chelsea dallas biteme matrix yankees 6969 corvette austin access thunder merlin secret diamond hello hammer fucker
1234qwer silver gfhjkm internet samantha golfer scooter test orange cookie q1w2e3r4t5 maverick sparky phoenix mickey bigdog
snoopy guitar whatever chicken camaro mercedes peanut ferrari falcon cowboy welcome sexy samsung steelers smokey dakota arsenal
boomer eagles tigers marina nascar booboo gateway yellow porsche monster spider diablo hannah bulldog junior london purple
compaq lakers iceman qwer1234 hardcore cowboys money banana ncc1701 boston tennis q1w2e3r4 coffee scooby 123654 nikita yamaha
mother barney brandy chester fuckoff oliver player forever rangers midnight chicago bigdaddy redsox angel badboy fender jasper
slayer rabbit natasha marine bigdick wizard marlboro raiders prince casper fishing flower jasmine iwantu panties adidas winter
winner gandalf password1 enter ghbdtn 1q2w3e4r golden cocacola jordan23 winston madison angels panther blowme sexsex bigtits
spanky bitch sophie asdfasdf horny thx1138 toyota tiger dick canada 12344321 blowjob 8675309 muffin liverpoo apples qwerty123
passw0rd abcd1234 pokemon 123abc slipknot qazxsw 123456a scorpion qwaszx butter startrek rainbow asdfghjkl razz newyork redskins
gemini cameron qazwsxedc florida liverpool turtle sierra viking booger butthead doctor rocket 159357 dolphins captain bandit
jaguar packers pookie peaches 789456 asdf dolphin helpme blue theman maxwell qwertyui shithead lovers maddog giants nirvana
metallic hotdog rosebud mountain warrior stupid elephant suckit success bond007 jackass alexis porn lucky scorpio samson q1w2e3
azerty rush2112 driver freddy 1q2w3e4r5t sydney gators dexter red123 123456q 12345a bubba creative voodoo golf trouble america
nissan gunner garfield bullshit asdfghjk 5150 fucking apollo 1qazxsw2 2112 eminem legend airborne bear beavis apple brooklyn
godzilla skippy 4815162342 buddy qwert kitten magic shelby beaver phantom asdasd xavier braves darkness blink182 copper platinum
qweqwe tomcat 01012011 girls bigboy 102030 animal police online 11223344 voyager lifehack 12qwaszx fish sniper 315475 trinity
blazer heaven lover snowball playboy loveme bubbles hooters cricket willow donkey topgun nintendo saturn destiny pakistan
pumpkin digital sergey redwings explorer tits private runner therock guinness lasvegas beatles 789456123 fire cassie christin
qwerty1 celtic asdf1234 andrey broncos 007007 babygirl eclipse fluffy cartman michigan carolina testing alexande birdie pantera
cherry vampire mexico dickhead buffalo genius montana beer minecraft maximus flyers lovely stalker metallica doggie snickers
speedy bronco lol123 paradise yankee horses magnum dreams 147258369 lacrosse ou812 goober enigma qwertyu scotty pimpin bollocks
surfer cock poohbear genesis star asd123 qweasdzxc racing hello1 hawaii eagle1 viper poopoo einstein boobies 12345q bitches
drowssap simple badger alaska action jester drummer 111222 spitfire forest maryjane champion diesel svetlana friday hotrod
147258 chevy lucky1 westside security google badass tester shorty thumper hitman mozart zaq12wsx boobs reddog 010203 lizard
a123456 123456789a ruslan eagle 1232323q scarface qwerty12 147852 a12345 buddha porno 420420 spirit money1 stargate qwe123
naruto mercury liberty 12345qwert semperfi suzuki popcorn spooky marley scotland kitty cherokee vikings simpsons rascal qweasd
hummer loveyou michael1 patches russia jupiter penguin passion cumshot vfhbyf honda vladimir sandman passport raider bastard
123789 infinity assman bulldogs fantasy sucker 1234554321 horney domino budlight disney ironman usuckballz1 softball brutus
redrum bigred mnbvcxz fktrcfylh karina marines digger kawasaki cougar fireman oksana monday cunt justice nigger super wildcats
tinker logitech dancer swordfis avalon everton alexandr motorola patriots hentai madonna pussy1 ducati colorado connor juventus
galore smooth freeuser warcraft boogie titanic wolverin elizabet arizona valentin saints asdfg accord test123 password123 christ
yfnfif stinky slut spiderma naughty chopper hello123 ncc1701d extreme skyline poop zombie pearljam 123qweasd froggy awesome
vision pirate fylhtq dreamer bullet predator empire 123123a kirill charlie1 panthers penis skipper nemesis rasdzv3 peekaboo
rolltide cardinal psycho danger mookie happy1 wanker chevelle manutd goblue 9379992 hobbes vegeta fyfcnfcbz 852456 picard 159951
windows loverboy victory vfrcbv bambam serega 123654789 turkey tweety galina hiphop rooster changeme berlin taurus suckme polina
electric avatar 134679 maksim raptor alpha1 hendrix newport bigcock brazil spring a1b2c3 madmax alpha britney sublime darkside
bigman wolfpack classic hercules ronaldo letmein1 1q2w3e 741852963 spiderman blizzard 123456789q cheyenne cjkysirj tiger1 wombat
bubba1 pandora zxc123 holiday wildcat devils horse alabama 147852369 caesar 12312 buddy1 bondage pussycat pickle shaggy catch22
leather chronic a1b2c3d4 admin qqq111 qaz123 airplane kodiak freepass billybob sunset katana phpbb chocolat snowman angel1
stingray firebird wolves zeppelin detroit pontiac gundam panzer vagina outlaw redhead tarheels greenday nastya 01011980 hardon
engineer dragon1 hellfire serenity cobra fireball lickme darkstar 1029384756 01011 mustang1 flash 124578 strike beauty pavilion
01012000 bobafett dbrnjhbz bigmac bowling chris1 ytrewq natali pyramid rulez welcome1 dodgers apache swimming whynot teens
trooper fuckit defender precious 135790 packard weasel popeye lucifer cancer icecream 142536 raven swordfish presario viktor
rockstar blonde james1 wutang spike pimp atlanta airforce thailand casino lennon mouse 741852 hacker bluebird hawkeye 456123
theone catfish sailor goldfish nfnmzyf tattoo pervert barbie maxima nipples machine trucks wrangler rocks tornado lights
cadillac bubble pegasus madman longhorn browns target 666999 eatme qazwsx123 microsoft dilbert christia baller lesbian shooter
xfiles seattle qazqaz cthutq amateur prelude corona freaky malibu 123qweasdzxc assassin 246810 atlantis integra pussies iloveu
lonewolf dragons monkey1 unicorn software bobcat stealth peewee openup 753951 srinivas zaqwsx valentina shotgun trigger veronika
bruins coyote babydoll joker dollar lestat rocky1 hottie random butterfly wordpass smiley sweety snake chipper woody samurai
devildog gizmo maddie soso123aljg mistress freedom1 flipper express hjvfirf moose cessna piglet polaris teacher montreal cookies
wolfgang scully fatboy wicked balls tickle bunny dfvgbh foobar transam pepsi fetish oicu812 basketba toshiba hotstuff sunday
booty gambit 31415926 impala stephani jessica1 hooker lancer knicks shamrock fuckyou2 stinger 314159 redneck deftones squirt
siemens blaster trucker subaru renegade ibanez manson swinger reaper blondie mylove galaxy blahblah enterpri travel 1234abcd
babylon5 indiana skeeter master1 sugar ficken smoke bigone sweetpea fucked trfnthbyf marino escort smitty bigfoot babes larisa
trumpet spartan valera babylon asdfghj yankees1 bigboobs stormy mister hamlet aardvark butterfl marathon paladin cavalier
manchester skater indigo hornet buckeyes 01011990 indians karate hesoyam toronto diamonds chiefs buckeye 1qaz2wsx3edc highland
hotsex charger redman passwor maiden drpepper storm pornstar garden 12345678910 pencil sherlock timber thuglife insane pizza
jungle jesus1 aragorn 1a2b3c hamster david1 triumph techno lollol pioneer catdog 321654 fktrctq morpheus 141627 pascal shadow1
hobbit wetpussy erotic consumer blabla justme stones chrissy spartak goforit burger pitbull adgjmptw italia barcelona hunting
colors kissme virgin overlord pebbles sundance emerald doggy racecar irina element 1478963 zipper alpine basket goddess poison
nipple sakura chichi huskers 13579 pussys q12345 ultimate ncc1701e blackie nicola rommel matthew1 caserta omega geronimo sammy1
trojan 123qwe123 philips nugget tarzan chicks aleksandr bassman trixie portugal anakin dodger bomber superfly madness
q1w2e3r4t5y6 loser 123asd fatcat ybrbnf soldier warlock wrinkle1 desire sexual babe seminole alejandr 951753 11235813 westham
andrei concrete access14 weed letmein2 ladybug naked christop trombone tintin bluesky rhbcnbyf qazxswedc onelove cdtnkfyf whore
vfvjxrf titans stallion truck hansolo blue22 smiles beagle panama kingkong flatron inferno mongoose connect poiuyt snatch qawsed
juice blessed rocker snakes turbo bluemoon sex4me finger jamaica a1234567 mulder beetle fuckyou1 passat immortal plastic
123454321 anthony1 whiskey dietcoke suck spunky magic1 monitor cactus exigen planet ripper teen spyder apple1 nolimit hollywoo
sluts sticky trunks 1234321 14789632 pickles sailing bonehead ghbdtnbr delta charlott rubber 911911 112358 molly1 yomama
hongkong jumper william1 ilovesex faster unreal cumming memphis 1123581321 nylons legion sebastia shalom pentium geheim werewolf
funtime ferret orion curious 555666 niners cantona sprite philly pirates abgrtyu lollipop eternity boeing super123 sweets
cooldude tottenha green1 jackoff stocking 7895123 moomoo martini biscuit drizzt colt45 fossil makaveli snapper satan666 maniac
salmon patriot verbatim nasty shasta asdzxc shaved blackcat raistlin qwerty12345 punkrock cjkywt 01012010 4128 waterloo crimson
twister oxford musicman seinfeld biggie condor ravens megadeth wolfman cosmos sharks banshee keeper foxtrot gn56gn56 skywalke
velvet black1 sesame dogs squirrel privet sunrise wolverine sucks legolas grendel ghost cats carrot frosty lvbnhbq blades
stardust frog qazwsxed 121314 coolio brownie groovy twilight daytona vanhalen pikachu peanuts licker hershey jericho intrepid
ninja 1234567a zaq123 lobster goblin punisher strider shogun kansas amadeus seven7 jason1 neptune showtime muscle oldman
ekaterina rfrfirf getsome showme 111222333 obiwan skittles danni tanker maestro tarheel anubis hannibal anal newlife gothic
shark fighter blue123 blues 123456z princes slick chaos thunder1 sabine 1q2w3e4r5t6y python test1 mirage devil clover tequila
chelsea1 surfing delete potato chubby panasonic sandiego portland baggins fusion sooners blackdog buttons californ moscow
playtime mature 1a2b3c4d dagger dima stimpy asdf123 gangster warriors iverson chargers byteme swallow liquid lucky7 dingdong
nymets cracker mushroom 456852 crusader bigguy miami dkflbvbh bugger nimrod tazman stranger newpass doodle powder gotcha
guardian dublin slapshot septembe 147896325 pepsi1 milano grizzly woody1 knights photos 2468 nookie charly rammstein brasil
123321123 scruffy munchkin poopie 123098 kittycat latino walnut 1701 thegame viper1 1passwor kolobok picasso robert1 barcelon
bananas trance auburn coltrane eatshit goodluck starcraft wheels parrot postal blade wisdom pink gorilla katerina pass123
andrew1 shaney14 dumbass osiris fuck_inside oakland discover ranger1 spanking lonestar bingo meridian ping heather1 dookie
stonecol megaman 192837465 rjntyjr ledzep lowrider 25802580 richard1 firefly griffey racerx paradox ghjcnj gangsta zaq1xsw2
tacobell weezer sirius halflife buffett shiloh 123698745 vertigo sergei aliens sobaka keyboard kangaroo sinner soccer1 0.0.000
bonjour socrates chucky hotboy sprint 0007 sarah1 scarlet celica shazam formula1 sommer trebor qwerasdf jeep mailcreated5240
bollox asshole1 fuckface honda1 rebels vacation lexmark penguins 12369874 ragnarok formula 258456 tempest vfhecz tacoma qwertz
colombia flames rockon duck prodigy wookie dodgeram mustangs 123qaz sithlord smoker server bang incubus scoobydo oblivion molson
kitkat titleist rescue zxcv1234 carpet 1122 bigballs tardis jimbob xanadu blueeyes shaman mersedes pooper pussy69 golfing hearts
mallard 12312312 kenwood patrick1 dogg cowboys1 oracle 123zxc nuttertools 102938 topper 1122334455 shemale sleepy gremlin
yourmom 123987 gateway1 printer monkeys peterpan mikey kingston cooler analsex jimbo pa55word asterix freckles birdman frank1
defiant aussie stud blondes tatyana 445566 aspirine mariners jackal deadhead katrin anime rootbeer frogger polo scooter1 hallo
noodles thomas1 parola shaolin celine 11112222 plymouth creampie justdoit ohyeah fatass assfuck amazon 1234567q kisses magnus
camel nopass bosco 987456 6751520 harley1 putter champs massive spidey lightnin camelot letsgo gizmodo aezakmi bones caliente
12121 goodtime thankyou raiders1 brucelee redalert aquarius 456654 catherin smokin pooh mypass astros roller porkchop sapphire
qwert123 kevin1 a1s2d3f4 beckham atomic rusty1 vanilla qazwsxedcrfv hunter1 kaktus cxfcnmt blacky 753159 elvis1 aggies blackjac
bangkok scream 123321q iforgot power1 kasper abc12 buster1 slappy shitty veritas chevrole amber1 01012001 vader amsterdam jammer
primus spectrum eduard granny horny1 sasha1 clancy usa123 satan diamond1 hitler avenger 1221 spankme 123456qwerty simba smudge
scrappy labrador john316 syracuse front242 falcons husker candyman commando gator pacman delta1 pancho krishna fatman clitoris
pineappl lesbians 8j4ye3uz barkley vulcan punkin boner celtics monopoly flyboy romashka hamburg 123456aa lick gangbang 223344
area51 spartans aaa111 tricky snuggles drago homerun vectra homer1 hermes topcat cuddles infiniti 1234567890q cosworth goose
phoenix1 killer1 ivanov bossman qawsedrf peugeot exigent doberman durango brandon1 plumber telefon horndog laguna rbhbkk dawg
webmaster breeze beast porsche9 beefcake leopard redbull oscar1 topdog godsmack theking pics omega1 speaker viktoria fuckers
bowler starbuck gjkbyf valhalla anarchy blacks herbie kingpin starfish nokia loveit achilles 906090 labtec ncc1701a fitness
jordan1 brando arsenal1 bull kicker napass desert sailboat bohica tractor hidden muppet jackson1 jimmy1 terminator phillies
pa55w0rd terror farside swingers legacy frontier butthole doughboy jrcfyf tuesday sabbath daniel1 nebraska homers qwertyuio
azamat fallen agent007 striker camels iguana looker pinkfloy moloko qwerty123456 dannyboy luckydog 789654 pistol whocares
charmed skiing select franky puppy daniil vladik vette vfrcbvrf ihateyou nevada moneys vkontakte mandingo puppies 666777 mystic
zidane kotenok dilligaf budman bunghole zvezda 123457 triton golfball technics trojans panda laptop rookie 01011991 15426378
aberdeen gustav jethro enterprise igor stripper filter hurrican rfnthbyf lespaul gizmo1 butch 132435 dthjybrf 1366613 excalibu
963852 nofear momoney possum cutter oilers moocow cupcake gbpltw batman1 splash svetik super1 soleil bogdan melissa1 vipers
babyboy tdutybq lancelot ccbill keystone passwort flamingo firefox dogman vortex rebel noodle raven1 zaphod killme pokemon1
coolman danila designer skinny kamikaze deadman gopher doobie warhammer deeznuts freaks engage chevy1 steve1 apollo13 poncho
hammers azsxdc dracula 000007 sassy bitch1 boots deskjet 12332 macdaddy mighty rangers1 manchest sterlin casey1 meatball mailman
sinatra cthulhu summer1 bubbas cartoon bicycle eatpussy truelove sentinel tolkien breast capone lickit summit 123456k peter1
daisy1 kitty1 123456789z crazy1 jamesbon texas1 sexygirl 362436 sonic billyboy redhot microsof microlab daddy1 rockets iloveyo
fernand gordon24 danie cutlass polska star69 titties pantyhos 01011985 thekid aikido gofish mayday 1234qwe coke anfield sony
lansing smut scotch sexx catman 73501505 hustler saun dfkthbz passwor1 jenny1 azsxdcfv cheers irish1 gabrie tinman orioles 1225
charlton fortuna 01011970 airbus rustam xtreme bigmoney zxcasd retard grumpy huskies boxing 4runner kelly1 ultima warlord
fordf150 oranges rotten asdfjkl superstar denali sultan bikini saratoga thor figaro sixers wildfire vladislav 128500 sparta
mayhem greenbay chewie music1 number1 cancun fabie mellon poiuytrewq cloud9 crunch bigtime chicken1 piccolo bigbird 321654987
billy1 mojo 01011981 maradona sandro chester1 bizkit rjirfrgbde 789123 rightnow jasmine1 hyperion treasure meatloaf armani
rovers jarhead 01011986 cruise coconut dragoon utopia davids cosmo rfhbyf reebok 1066 charli giorgi sticks sayang pass1234
exodus anaconda zaqxsw illini woofwoof emily1 sandy1 packer poontang govols jedi tomato beaner cooter creamy lionking happy123
albatros poodle kenworth dinosaur greens goku happyday eeyore tsunami cabbage holyshit turkey50 memorex chaser bogart orgasm
tommy1 volley whisper knopka ericsson walleye 321123 pepper1 katie1 chickens tyler1 corrado twisted 100000 zorro clemson
zxcasdqwe tootsie milana zenith fktrcfylhf shania frisco polniypizdec0211 crazybab junebug fugazi rereirf vfvekz 1001 sausage
vfczyz koshka clapton justin1 anhyeuem condom fubar hardrock skywalker tundra cocks gringo 150781 canon vitalik aspire stocks
samsung1 applepie abc12345 arjay gandalf1 boob pillow sparkle gmoney rockhard lucky13 samiam everest hellyeah bigsexy skorpion
rfrnec hedgehog australi candle slacker dicks voyeur jazzman america1 bobby1 br0d3r wolfie vfksirf 1qa2ws3ed 13243546 fright
yosemite temp karolina fart barsik surf cheetah baddog deniska starship bootie milena hithere kume greatone dildo 50cent
0.0.0.000 albion amanda1 midget lion maxell football1 cyclone freeporn nikola bonsai kenshin slider balloon roadkill killbill
222333 jerkoff 78945612 dinamo tekken rambler goliath cinnamon malaka backdoor fiesta packers1 rastaman fletch sojdlg123aljg
stefano artemis calico nyjets damnit robotech duchess rctybz hooter keywest 18436572 hal9000 mechanic pingpong operator presto
sword rasputin spank bristol faggot shado 963852741 amsterda 321456 wibble carrera alibaba majestic ramses duster route66
trident clipper steeler wrestlin divine kipper gotohell kingfish snake1 passwords buttman pompey viagra zxcvbnm1 spurs 332211
slutty lineage2 oleg macross pooter brian1 qwert1 charles1 slave jokers yzerman swimmer ne1469 nwo4life solnce seamus lolipop
pupsik moose1 ivanova secret1 matador love69 420247 ktyjxrf subway cinder vermont pussie chico florian magick guiness allsop
ghetto flash1 a123456789 typhoon dfkthf depeche skydive dammit seeker fuckthis crysis kcj9wx5n umbrella r2d2c3po 123123q
snoopdog critter theboss ding 162534 splinter kinky cyclops jayhawk 456321 caramel qwer123 underdog caveman onlyme grapes
feather hotshot fuckher renault george1 sex123 pippen 000001 789987 floppy cunts megapass 1000 pornos usmc kickass great1
quattro 135246 wassup helloo p0015123 nicole1 chivas shannon1 bullseye java fishes blackhaw jamesbond tunafish juggalo dkflbckfd
123789456 dallas1 translator 122333 beanie alucard gfhjkm123 supersta magicman ashley1 cohiba xbox360 caligula 12131415 facial
7753191 dfktynbyf cobra1 cigars fang klingon bob123 safari looser 10203 deepthroat malina 200000 tazmania gonzo goalie jacob1
monaco cruiser misfit vh5150 tommyboy marino13 yousuck sharky vfhufhbnf horizon absolut brighton 123456r death1 kungfu maxx
forfun mamapapa enter1 budweise banker getmoney kostya qazwsx12 bigbear vector fallout nudist gunners royals chainsaw scania
trader blueboy walrus eastside kahuna qwerty1234 love123 steph 01011989 cypress champ undertaker ybrjkfq europa snowboar sabres
moneyman chrisbln minime nipper groucho whitey viewsonic penthous wolf359 fabric flounder coolguy whitesox passme smegma skidoo
thanatos fucku2 snapple dalejr mondeo thesims mybaby panasoni sinbad thecat topher frodo sneakers q123456 z1x2c3 alfa chicago1
taylor1 ghjcnjnfr cat123 olivier cyber titanium 0420 madison1 jabroni dang hambone intruder holly1 gargoyle sadie1 static
poseidon studly newcastl sexxxx poppy johannes danzig beastie musica buckshot sunnyday adonis bluedog bonkers 2128506 chrono
compute spawn 01011988 turbo1 smelly wapbbs goldstar ferrari1 778899 quantum pisces boomboom gunnar 1024 test1234 florida1 nike
superman1 multiplelo custom motherlode 1qwerty westwood usnavy apple123 daewoo korn stereo sasuke sunflowe watcher dharma 555777
mouse1 assholes babyblue 123qwerty marius walmart snoop starfire tigger1 paintbal knickers aaliyah lokomotiv theend winston1
sapper rover erotica scanner racer zeus sexy69 doogie bayern joshua1 newbie scott1 losers droopy outkast martin1 dodge1 wasser
ufkbyf rjycnfynby thirteen 12345z 112211 hotred deejay hotpussy 192837 jessic philippe scout panther1 cubbies havefun magpie
fghtkm avalanch newyork1 pudding leonid harry1 cbr600 audia4 bimmer fucku 01011984 idontknow vfvfgfgf 1357 aleksey builder
01011987 zerocool godfather mylife donuts allmine redfish 777888 sascha nitram bounce 333666 smokes 1x2zkg8w rodman stunner
zxasqw12 hoosier hairy beretta insert 123456s rtyuehe francesc tights cheese1 micron quartz hockey1 gegcbr searay jewels bogey
paintball celeron padres bing syncmaster ziggy simon1 beaches prissy diehard orange1 mittens aleksandra queens 02071986 biggles
thongs southpark artur twinkle gretzky rabota cambiami monalisa gollum chuckles spike1 gladiator whisky spongebob sexy1 03082006
mazafaka meathead 4121 ou8122 barefoot 12345678q cfitymrf bigass a1s2d3 kosmos blessing titty clevelan terrapin ginger1 johnboy
maggot clarinet deeznutz 336699 stumpy stoney footbal traveler volvo bucket snapon pianoman hawkeyes futbol casanova tango
goodboy scuba honey1 sexyman warthog mustard abc1234 nickel 10203040 meowmeow 1012 boricua prophet sauron 12qwas reefer
andromeda crystal1 joker1 90210 goofy loco lovesex triangle whatsup mellow bengals monster1 maste 01011910 lover1 love1 123aaa
sunshin smeghead hokies sting welder rambo cerberus bunny1 rockford monke 1q2w3e4r5 goldwing gabriell buzzard crjhgbjy james007
rainman groove tiberius purdue nokia6300 hayabusa shou jagger diver zigzag poochie usarmy phish redwood redwing 12345679
salamander silver1 abcd123 sputnik boobie ripple eternal 12qw34er thegreat allstar slinky gesperrt mishka whiskers pinhead
overkill sweet1 rhfcjnrf montgom240 sersolution jamie1 starman proxy swords nikolay bacardi rasta badgirl rebecca1 wildman
penny1 spaceman 1007 10101 logan1 hacked bulldog1 helmet windsor buffy1 runescape trapper 123451 banane dbrnjh ripken 12345qwe
frisky shun fester oasis lightning ib6ub9 cicero kool pony thedog 784512 01011992 megatron illusion edward1 napster 11223 squash
roadking woohoo 19411945 hoosiers 01091989 tracker bagira midway leavemealone br549 14725836 235689 menace rachel1 feng laser
stoned realmadrid 787898 balloons tinkerbell 5551212 maria1 pobeda heineken sonics moonlight optimus comet orchid 02071982
jaybird kashmir 12345678a chuang chunky peach mortgage rulezzz saleen chuckie zippy fishing1 gsxr750 doghouse maxim reader shai
buddah benfica chou salomon meister eraser blackbir bigmike starter pissing angus deluxe eagles1 hardcock 135792468 mian
seahawks godfathe bookworm gregor intel talisman blackjack babyface hawaiian dogfood zhong 01011975 sancho ludmila medusa
mortimer 123456654321 roadrunn just4me stalin 01011993 handyman alphabet pizzas calgary clouds password2 cgfhnfr f**k cubswin
gong lexus max123 xxx123 digital1 gfhjkm1 7779311 missy1 michae beautifu gator1 1005 pacers buddie chinook heckfy dutchess
sally1 breasts beowulf darkman jenn tiffany1 zhei quan qazwsx1 satana shang idontkno smiths puddin nasty1 teddybea valkyrie
passwd chao boxster killers yoda cheater inuyasha beast1 wareagle foryou dragonball mermaid bhbirf teddy1 dolphin1 misty1 delphi
gromit sponge qazzaq fytxrf gameover diao sergi beamer beemer kittykat rancid manowar adam12 diggler assword austin1 wishbone
gonavy sparky1 fisting thedude sinister 1213 venera novell salsero jayden fuckoff1 linda1 vedder 02021987 1pussy redline lust
jktymrf 02011985 dfcbkbq dragon12 chrome gamecube titten cong bella1 leng 02081988 eureka bitchass 147369 banner lakota 123321a
mustafa preacher hotbox 02041986 z1x2c3v4 playstation 01011977 claymore electra checkers zheng qing armagedon 02051986 wrestle
svoboda bulls nimbus alenka madina newpass6 onetime aa123456 bartman 02091987 silverad electron 12345t devil666 oliver1 skylar
rhtdtlrj gobucks johann 12011987 milkman 02101985 camper thunderb bigbutt jammin davide cheeks goaway lighter claudi thumbs
pissoff ghostrider cocaine teng squall lotus hootie blackout doitnow subzero 02031986 marine1 02021988 pothead 123456qw skate
1369 peng antoni neng miao bcfields 1492 marika 794613 musashi tulips nong piao chai ruan southpar 02061985 nude mandarin 654123
ninjas cannabis jetski xerxes zhuang kleopatra dickie bilbo pinky morgan1 1020 1017 dieter baseball1 tottenham quest yfnfkmz
dirtbike 1234567890a mango jackson5 ipswich iamgod 02011987 tdutybz modena qiao slippery qweasd123 bluefish samtron toon 111333
iscool 02091986 petrov fuzzy zhou 1357924680 mollydog deng 02021986 1236987 pheonix zhun ghblehjr othello starcraf 000111
sanfran a11111 cameltoe badman vasilisa jiang 1qaz2ws luan sveta 12qw12 akira chuai 369963 cheech beatle pickup paloma 01011983
caravan elizaveta gawker banzai pussey mullet seng bingo1 bearcat flexible farscape borussia zhuai templar guitar1 toolman
yfcntymrf chloe1 xiang slave1 guai nuggets 02081984 mantis slim scorpio1 fyutkbyf thedoors 02081987 02061986 123qq123 zappa
fergie 7ugd5hip2j huai asdfzxcv sunflower pussyman deadpool bigtit 01011982 love12 lassie skyler gatorade carpedie jockey
mancity spectre 02021984 cameron1 artemka reng 02031984 iomega jing moritz spice rhino spinner heater zhai hover talon grease
qiong corleone ltybcrf tian cowboy1 hippie chimera ting alex123 02021985 mickey1 corsair sonoma aaron1 xxxpass bacchus webmaste
chuo xyz123 chrysler spurs1 artem shei cosmic 01020304 deutsch gabriel1 123455 oceans 987456321 binladen latinas a12345678
speedo buttercu 02081989 21031988 merlot millwall ceng kotaku jiong dragonba 2580 stonecold snuffy 01011999 02011986 hellos
blaze maggie1 slapper istanbul bonjovi babylove mazda bullfrog phoeni meng porsche1 nomore 02061989 bobdylan capslock orion1
zaraza teddybear ntktajy myname rong wraith mets niao 02041984 smokie chevrolet dialog gfhjkmgfhjkm dotcom vadim monarch athlon
mikey1 hamish pian liang coolness chui thoma ramones ciccio chippy eddie1 house1 ning marker cougars jackpot barbados reds
pdtplf knockers cobalt amateurs dipshit napoli kilroy pulsar jayhawks daemon alexey weng shuang 9293709b13 shiner eldorado
soulmate mclaren golfer1 andromed duan 50spanks sexyboy dogshit 02021983 shuo kakashka syzygy 111111a yeahbaby qiang netscape
fulham 120676 gooner zhui rainbow6 laurent dog123 halifax freeway carlitos 147963 eastwood microphone monkey12 1123 persik
coldbeer geng nuan danny1 fgtkmcby entropy gadget just4fun sophi baggio carlito 1234567891 02021989 02041983 specialk piramida
suan bigblue salasana hopeful mephisto bailey1 hack annie1 generic violetta spencer1 arcadia 02051983 hondas 9562876 trainer
jones1 smashing liao 159632 iceberg rebel1 snooker temp123 zang matteo fastball q2w3e4r5 bamboo fuckyo shutup astro buddyboy
nikitos redbird maxxxx shitface 02031987 kuai kissmyass sahara radiohea 1234asdf wildcard maxwell1 patric plasma heynow bruno1
shao bigfish misfits sassy1 sheng 02011988 02081986 testpass nanook cygnus licking slavik pringles xing 1022 ninja1 submit
dundee tiburon pinkfloyd yummy shuai guang chopin obelix insomnia stroker 1a2s3d4f 1223 playboy1 lazarus jorda spider1 homerj
sleeper 02041982 darklord cang 02041988 02041987 tripod magician jelly telephon 15975 vsjasnel12 pasword iverson3 pavlov homeboy
gamecock amigo brodie budapest yjdsqgfhjkm reckless 02011980 pang tiger123 2469 mason1 orient 01011979 zong cdtnbr maksimka 1011
bushido taxman giorgio sphinx kazantip 02101984 concorde verizon lovebug georg sam123 seadoo qazwsxedc123 jiao jezebel pharmacy
abnormal jellybea maxime puffy islander bunnies jiggaman drakon 010180 pluto zhjckfd 12365 classics crusher mordor hooligan
strawberry 02081985 scrabble hawaii50 1224 wg8e3wjf cthtuf premium arrow 123456qwe mazda626 ramrod tootie rhjrjlbk ghost1 1211
bounty niang 02071984 goat killer12 sweetnes porno1 masamune 426hemi corolla mariposa hjccbz doomsday bummer blue12 zhao bird33
excalibur samsun kirsty buttfuck kfhbcf zhuo marcello ozzy 02021982 dynamite 655321 master12 123465 lollypop stepan 1qa2ws
spiker goirish callum michael2 moonbeam attila henry1 lindros andrea1 sporty lantern 12365478 nextel violin volcom 998877 water1
imation inspiron dynamo citadel placebo clowns tiao 02061988 tripper dabears haggis merlin1 02031985 anthrax amerika iloveme
vsegda burrito bombers snowboard forsaken katarina a1a2a3 woofer tigger2 fullmoon tiger2 spock hannah1 snoopy1 sexxxy sausages
stanislav cobain robotics exotic green123 mobydick senators pumpkins fergus asddsa 147741 258852 windsurf reddevil vfitymrf
nevermind nang woodland 4417 mick shui q1q2q3 wingman 69696 superb zuan ganesh pecker zephyr anastasiya icu812 larry1 02081982
broker zalupa mihail vfibyf dogger 7007 paddle varvara schalke 1z2x3c presiden yankees2 tuning poopy 02051982 concord vanguard
stiffy rjhjktdf felix1 wrench firewall boxer bubba69 popper 02011984 temppass gobears cuan tipper fuckme1 kamila thong puss
bigcat drummer1 02031982 sowhat digimon tigers1 rang jingle bian uranus soprano mandy1 dusty1 fandango aloha pumpkin1 postman
02061980 dogcat bombay pussy123 onetwo highheel pippo julie1 laura1 pepito beng smokey1 stylus stratus reload duckie karen1
jimbo1 225588 369258 krusty snappy asdf12 electro 111qqq kuang fishin clit abstr christma qqqqq1 1234560 carnage guyver boxers
kittens zeng 1000000 qwerty11 toaster cramps yugioh 02061987 icehouse zxcvbnm123 pineapple namaste harrypotter mygirl falcon1
earnhard fender1 spikes nutmeg 01081989 dogboy 02091983 369852 softail mypassword prowler bigboss 1112 harvest heng jubilee
killjoy basset keng zaqxswcde redsox1 biao titan misfit99 robot wifey kidrock 02101987 gameboy enrico 1z2x3c4v broncos1 arrows
havana banger cookie1 chriss 123qw platypus cindy1 lumber pinball foxy london1 1023 05051987 02041985 password12 superma longbow
radiohead nigga 12051988 spongebo qwert12345 abrakadabra dodgers1 02101989 chillin niceguy pistons hookup santafe bigben jets
1013 vikings1 mankind viktoriya beardog hammer1 02071980 reddwarf magelan longjohn jennife gilles carmex2 02071987 stasik bumper
doofus slamdunk pixies garion steffi alessandro beerman niceass warrior1 honolulu 134679852 visa johndeer mother1 windmill
boozer oatmeal aptiva busty delight tasty slick1 bergkamp badgers guitars puffin 02091981 nikki1 irishman miller1 zildjian
123000 airwolf magnet anai install 02041981 02061983 astra romans megan1 mudvayne freebird muscles dogbert 02091980 02091984
snowflak 01011900 mang joseph1 nygiants playstat junior1 vjcrdf qwer12 webhompas giraffe pelican jefferso comanche bruiser
monkeybo kjkszpj 123456l micro albany 02051987 angel123 epsilon
`;

export const commonPasswords: ReadonlySet<string> = new Set(list.split(/\s+/).filter((entry) => entry !== ''));
